#include "config.h"

#include "base/alloc.h"
#include "base/text.h"
#include "core/element.h"
#include "graph/graph.h"
#include "lewis/internal.h"

#include <stdio.h>
#include <stdlib.h>
#include <string.h>

enum { MENDS_KEPT = 5, EDITED_ATOMS_MAX = 12, MENDED_ATOMS_MAX = 150 };

/* A search over small edits: each is tried on a copy and kept where the engine
 * then finds the species sound. */
struct mending {
    struct lewis *l;
    const struct species *s;
    struct lewis_options options;
    int parts;                     /* of the species as it stands */
    int *orbit;                    /* [n_atoms] equivalent atoms share a number: one of them is tried */
    double weight[MENDS_KEPT + 1]; /* of the mends kept, ascending */
};

static void mend_done(struct mend *m)
{
    alloc_free(m->text);
    alloc_free(m->bonds);
    alloc_free(m->lone_pairs);
}

/* Where atom i of the edited species stands in the one shown: removed is the atom
 * that the edit took away, -1 for none. */
static int was_at(int i, int removed) { return removed >= 0 && i >= removed ? i + 1 : i; }

static void put_bond(struct mend *m, int a, int b, int order)
{
    m->bonds[m->n_bonds][0] = a;
    m->bonds[m->n_bonds][1] = b;
    m->bonds[m->n_bonds++][2] = order;
}

/* What the mended form changes against what is shown now, in the numbering of
 * the species shown; an added atom has the next number. */
static void describe_changes(struct mend *m, const struct species *from, const struct form *shown,
                             const struct species *to, const struct form *form, int removed)
{
    bool *kept = NEW_ARRAY(bool, from->n_bonds);
    int i;

    m->bonds = alloc_new((size_t)(from->n_bonds + to->n_bonds), sizeof *m->bonds);
    m->lone_pairs = alloc_new((size_t)to->n_atoms, sizeof *m->lone_pairs);
    for (i = 0; i < to->n_bonds; i++) {
        int a = was_at(to->bonds[i].a, removed), b = was_at(to->bonds[i].b, removed);
        int was = a < from->n_atoms && b < from->n_atoms ? species_bond_between(from, a, b) : -1;

        if (was >= 0)
            kept[was] = true;
        if (was < 0 || shown->order[was] != form->order[i])
            put_bond(m, a, b, form->order[i]);
    }
    for (i = 0; i < from->n_bonds; i++)
        if (!kept[i])
            put_bond(m, from->bonds[i].a, from->bonds[i].b, 0);
    for (i = 0; i < to->n_atoms; i++) {
        int was = was_at(i, removed);

        if (was < from->n_atoms && shown->lone_pairs[was] == form->lone_pairs[i])
            continue;
        m->lone_pairs[m->n_lone_pairs][0] = was;
        m->lone_pairs[m->n_lone_pairs++][1] = form->lone_pairs[i];
    }
    alloc_free(kept);
}

/* Takes edited over. removed: the atom it lacks, -1 for none. */
static void try_edit(struct mending *w, struct species *edited, int removed, int size, double handicap,
                     const char *text)
{
    struct lewis *l = lewis_solve(edited, &w->options);
    double weight;
    int *part = NEW_ARRAY(int, edited->n_atoms), i, at, sum = 0;

    for (i = 0; i < l->n_findings; i++)
        if (l->findings[i].severity == SEVERITY_WARNING)
            handicap += 0.5;
    if (edited->multiplicity > w->s->multiplicity)
        handicap += 0.5;
    if (species_parts(edited, part) > w->parts)
        handicap += 1.5;
    alloc_free(part);
    for (i = 0; i < edited->n_atoms; i++)
        sum += abs(l->shown.formal_charge[i]);
    weight = size + handicap + 0.05 * sum + 0.1 * abs(edited->charge);
    if (l->verdict == VERDICT_SOUND) {
        struct lewis *to = w->l;
        struct mend m = {0};

        for (at = to->n_mends; at > 0 && w->weight[at - 1] > weight + 1e-9; at--)
            ;
        if (at < MENDS_KEPT) {
            to->mends = alloc_resize(to->mends, MENDS_KEPT + 1, sizeof *to->mends);
            for (i = to->n_mends; i > at; i--) {
                to->mends[i] = to->mends[i - 1];
                w->weight[i] = w->weight[i - 1];
            }
            m.text = alloc_text(text);
            m.charge = edited->charge;
            m.multiplicity = edited->multiplicity;
            m.size = size;
            describe_changes(&m, w->s, &to->shown, edited, &l->shown, removed);
            to->mends[at] = m;
            w->weight[at] = weight;
            if (++to->n_mends > MENDS_KEPT)
                mend_done(&to->mends[--to->n_mends]);
        }
    }
    lewis_free(l);
    species_free(edited);
}

static struct species *copy_for_edit(const struct mending *w)
{
    struct species *c = species_copy(w->s);

    c->as_drawn = false;
    return c;
}

static void try_charges(struct mending *w)
{
    int step;

    for (step = -3; step <= 3; step++) {
        struct species *c = copy_for_edit(w);
        char text[160];

        if (step == 0) {
            species_assume_multiplicity(c);
            if (c->multiplicity == w->s->multiplicity && !w->s->as_drawn && !w->l->n_findings) {
                species_free(c);
                continue;
            }
            if (c->multiplicity != w->s->multiplicity)
                snprintf(text, sizeof text, "Take multiplicity %d.", c->multiplicity);
            else
                snprintf(text, sizeof text, "Take the best form instead of the drawn one.");
            try_edit(w, c, -1, 1, 0, text);
            continue;
        }
        species_set_charge(c, w->s->charge + step);
        species_assume_multiplicity(c);
        snprintf(text, sizeof text, "%s %d electron%s: net charge %+d%s.", step < 0 ? "Add" : "Take away", abs(step),
                 abs(step) == 1 ? "" : "s", c->charge,
                 c->multiplicity != w->s->multiplicity ? c->multiplicity == 1 ? ", multiplicity 1" : ", multiplicity 2"
                                                       : "");
        /* Changing the number of electrons by two mends a closed shell as one step does a radical. */
        try_edit(w, c, -1, abs(step) == 3 ? 2 : 1, abs(step) == 2 ? 0.2 : 0, text);
    }
}

/* Atoms that the errors name; all atoms where they name none and there are few. */
static int suspects(const struct mending *w, int *atoms)
{
    int i, k, m, n = 0;

    for (i = 0; i < w->l->n_findings; i++) {
        const struct finding *f = &w->l->findings[i];

        for (k = 0; f->severity == SEVERITY_ERROR && k < f->n_atoms; k++) {
            for (m = 0; m < n && atoms[m] != f->atoms[k]; m++)
                ;
            if (m == n && n < EDITED_ATOMS_MAX)
                atoms[n++] = f->atoms[k];
        }
    }
    for (i = 0; n == 0 && w->s->n_atoms <= EDITED_ATOMS_MAX && i < w->s->n_atoms; i++)
        atoms[i] = i;
    return n ? n : w->s->n_atoms <= EDITED_ATOMS_MAX ? w->s->n_atoms : 0;
}

static void try_hydrogen_on(struct mending *w, int atom)
{
    struct species *c = copy_for_edit(w);
    int h = species_add_atom(c, 1);
    char label[16], text[160];

    if (h < 0 || species_add_bond(c, atom, h, 1) < 0) {
        species_free(c);
        return;
    }
    species_assume_multiplicity(c);
    species_label(w->s, atom, label);
    snprintf(text, sizeof text, "Add a hydrogen to %s.", label);
    try_edit(w, c, -1, 1, 0.3, text);
}

static void try_hydrogen_off(struct mending *w, int atom)
{
    int near[SPECIES_NEIGHBOURS_MAX], degree = species_neighbours(w->s, atom, near, NULL), k;

    for (k = 0; k < degree; k++)
        if (w->s->atoms[near[k]].z == 1 && species_degree(w->s, near[k]) == 1) {
            struct species *c = copy_for_edit(w);
            char label[16], other[16], text[160];

            species_label(w->s, atom, label);
            species_label(w->s, near[k], other);
            species_remove_atom(c, near[k]);
            species_assume_multiplicity(c);
            snprintf(text, sizeof text, "Take %s away from %s.", other, label);
            try_edit(w, c, near[k], 1, 0.3, text);
            return;
        }
}

static void try_hydrogens(struct mending *w, const int *atoms, int n)
{
    int i, k;

    for (i = 0; i < n; i++) {
        for (k = 0; k < i && w->orbit[atoms[k]] != w->orbit[atoms[i]]; k++)
            ;
        if (k < i)
            continue;
        if (w->s->atoms[atoms[i]].z != 1)
            try_hydrogen_on(w, atoms[i]);
        try_hydrogen_off(w, atoms[i]);
    }
}

static bool names(const int *atoms, int n, int atom)
{
    int k;

    for (k = 0; k < n; k++)
        if (atoms[k] == atom)
            return true;
    return false;
}

/* True where an earlier bond joins atoms equivalent to those of bond i. */
static bool bond_repeats(const struct mending *w, int i)
{
    const struct bond *b = w->s->bonds;
    const int *orbit = w->orbit;
    int k;

    for (k = 0; k < i; k++)
        if ((orbit[b[k].a] == orbit[b[i].a] && orbit[b[k].b] == orbit[b[i].b]) ||
            (orbit[b[k].a] == orbit[b[i].b] && orbit[b[k].b] == orbit[b[i].a]))
            return true;
    return false;
}

static void try_bonds(struct mending *w, const int *atoms, int n)
{
    int i, k;
    char text[160], a[16], b[16];

    for (i = 0; i < w->s->n_bonds; i++) {
        const struct bond *bond = &w->s->bonds[i];
        struct species *c;

        if ((!names(atoms, n, bond->a) && !names(atoms, n, bond->b)) || bond_repeats(w, i))
            continue;
        c = copy_for_edit(w);
        species_remove_bond(c, i);
        species_assume_multiplicity(c);
        species_label(w->s, bond->a, a);
        species_label(w->s, bond->b, b);
        snprintf(text, sizeof text, "Take the bond between %s and %s away.", a, b);
        try_edit(w, c, -1, 1, 0.4, text);
    }
    for (i = 0; i < n; i++)
        for (k = i + 1; k < n; k++) {
            struct species *c = copy_for_edit(w);

            if (species_add_bond(c, atoms[i], atoms[k], 1) < 0) {
                species_free(c);
                continue;
            }
            species_assume_multiplicity(c);
            species_label(w->s, atoms[i], a);
            species_label(w->s, atoms[k], b);
            snprintf(text, sizeof text, "Bond %s and %s.", a, b);
            try_edit(w, c, -1, 1, 0.4, text);
        }
}

static void find_orbits(struct mending *w)
{
    const struct species *s = w->s;
    int *colour = NEW_ARRAY(int, s->n_atoms), *edge_colour = NEW_ARRAY(int, s->n_bonds), i;
    int(*edges)[2] = alloc_new((size_t)s->n_bonds, sizeof *edges);
    struct coloured_graph g = {s->n_atoms, colour, s->n_bonds, (const int(*)[2])edges, edge_colour};

    for (i = 0; i < s->n_atoms; i++)
        colour[i] = s->atoms[i].z * 400 + s->atoms[i].isotope;
    for (i = 0; i < s->n_bonds; i++) {
        edges[i][0] = s->bonds[i].a;
        edges[i][1] = s->bonds[i].b;
    }
    w->orbit = NEW_ARRAY(int, s->n_atoms);
    w->parts = species_parts(s, w->orbit);
    graph_orbits(&g, w->orbit);
    alloc_free(colour);
    alloc_free(edge_colour);
    alloc_free(edges);
}

static void try_pins(struct mending *w)
{
    struct species *c = copy_for_edit(w);
    bool pinned = false;
    int i;

    for (i = 0; i < c->n_atoms; i++) {
        pinned |= c->atoms[i].pin_pairs >= 0 || c->atoms[i].pin_odd >= 0;
        species_set_pins(c, i, PIN_NONE, PIN_NONE);
    }
    if (pinned)
        try_edit(w, c, -1, 1, -0.2, "Lift the pins.");
    else
        species_free(c);
}

void mends_search(struct lewis *l, const struct species *s, const struct lewis_options *options)
{
    struct mending w = {.l = l, .s = s, .options = *options};
    int atoms[EDITED_ATOMS_MAX], n;

    w.options.as_drawn = false;
    w.options.no_mends = true;
    w.options.list_max = 1;
    if (s->n_atoms == 0 || s->n_atoms > MENDED_ATOMS_MAX)
        return;
    find_orbits(&w);
    n = suspects(&w, atoms);
    try_charges(&w);
    try_pins(&w);
    try_hydrogens(&w, atoms, n);
    try_bonds(&w, atoms, n);
    alloc_free(w.orbit);
}
