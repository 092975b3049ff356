#include "config.h"

#include "core/species.h"

#include "base/alloc.h"
#include "base/text.h"
#include "core/element.h"

#include <assert.h>
#include <stdio.h>
#include <string.h>

#ifdef DW_INVARIANTS
#define HOLDS(s) assert(species_check(s) == NULL)
#else
#define HOLDS(s) ((void)0)
#endif

struct species *species_new(void)
{
    struct species *s = NEW(struct species);

    s->charge_assumed = true;
    s->multiplicity = 1;
    s->multiplicity_assumed = true;
    s->name = alloc_text("");
    s->note = alloc_text("");
    return s;
}

static void *copy_array(const void *from, int n, size_t size)
{
    void *to = alloc_new((size_t)n, size);

    if (n)
        memcpy(to, from, (size_t)n * size);
    return to;
}

struct species *species_copy(const struct species *s)
{
    struct species *c = NEW(struct species);

    *c = *s;
    c->atoms = copy_array(s->atoms, s->n_atoms, sizeof *s->atoms);
    c->atoms_room = s->n_atoms;
    c->bonds = copy_array(s->bonds, s->n_bonds, sizeof *s->bonds);
    c->bonds_room = s->n_bonds;
    c->stereo = copy_array(s->stereo, s->n_stereo, sizeof *s->stereo);
    c->name = alloc_text(s->name);
    c->note = alloc_text(s->note);
    return c;
}

void species_free(struct species *s)
{
    if (!s)
        return;
    alloc_free(s->atoms);
    alloc_free(s->bonds);
    alloc_free(s->stereo);
    alloc_free(s->name);
    alloc_free(s->note);
    alloc_free(s);
}

/* While nobody stated the multiplicity it follows the electron count. */
static void settle(struct species *s)
{
    if (s->multiplicity_assumed)
        s->multiplicity = species_lowest_multiplicity(s);
    HOLDS(s);
}

int species_add_atom(struct species *s, int z)
{
    struct atom *a;

    if (s->n_atoms >= SPECIES_ATOMS_MAX || !element_get(z))
        return -1;
    if (s->n_atoms == s->atoms_room) {
        s->atoms_room = s->atoms_room ? 2 * s->atoms_room : 8;
        s->atoms = alloc_resize(s->atoms, (size_t)s->atoms_room, sizeof *s->atoms);
    }
    a = &s->atoms[s->n_atoms++];
    memset(a, 0, sizeof *a);
    a->z = z;
    a->pin_pairs = a->pin_odd = PIN_NONE;
    settle(s);
    return s->n_atoms - 1;
}

static void drop_stereo(struct species *s, int atom)
{
    int i, j, kept = 0;

    for (i = 0; i < s->n_stereo; i++) {
        bool touched = s->stereo[i].atom == atom;

        for (j = 0; j < s->stereo[i].n; j++)
            touched |= s->stereo[i].neighbour[j] == atom;
        if (!touched)
            s->stereo[kept++] = s->stereo[i];
    }
    s->n_stereo = kept;
}

void species_remove_atom(struct species *s, int atom)
{
    int i, j;

    if (atom < 0 || atom >= s->n_atoms)
        return;
    drop_stereo(s, atom);
    for (i = 0; i < s->n_stereo; i++) {
        s->stereo[i].atom -= s->stereo[i].atom > atom;
        for (j = 0; j < s->stereo[i].n; j++)
            s->stereo[i].neighbour[j] -= s->stereo[i].neighbour[j] > atom;
    }
    for (i = j = 0; i < s->n_bonds; i++) {
        struct bond b = s->bonds[i];

        if (b.a == atom || b.b == atom)
            continue;
        b.a -= b.a > atom;
        b.b -= b.b > atom;
        s->bonds[j++] = b;
    }
    s->n_bonds = j;
    memmove(&s->atoms[atom], &s->atoms[atom + 1], (size_t)(s->n_atoms - atom - 1) * sizeof *s->atoms);
    s->n_atoms--;
    settle(s);
}

int species_add_bond(struct species *s, int a, int b, int order)
{
    struct bond *bond;

    if (a < 0 || b < 0 || a >= s->n_atoms || b >= s->n_atoms || a == b || order < 0 || order > 3)
        return -1;
    if (species_bond_between(s, a, b) >= 0 || species_degree(s, a) >= SPECIES_NEIGHBOURS_MAX ||
        species_degree(s, b) >= SPECIES_NEIGHBOURS_MAX)
        return -1;
    if (s->n_bonds == s->bonds_room) {
        s->bonds_room = s->bonds_room ? 2 * s->bonds_room : 8;
        s->bonds = alloc_resize(s->bonds, (size_t)s->bonds_room, sizeof *s->bonds);
    }
    bond = &s->bonds[s->n_bonds++];
    memset(bond, 0, sizeof *bond);
    bond->a = a < b ? a : b;
    bond->b = a < b ? b : a;
    bond->order = order;
    settle(s);
    return s->n_bonds - 1;
}

void species_remove_bond(struct species *s, int bond)
{
    if (bond < 0 || bond >= s->n_bonds)
        return;
    drop_stereo(s, s->bonds[bond].a);
    drop_stereo(s, s->bonds[bond].b);
    memmove(&s->bonds[bond], &s->bonds[bond + 1], (size_t)(s->n_bonds - bond - 1) * sizeof *s->bonds);
    s->n_bonds--;
    settle(s);
}

void species_set_element(struct species *s, int atom, int z)
{
    if (atom < 0 || atom >= s->n_atoms || !element_get(z))
        return;
    s->atoms[atom].z = z;
    s->atoms[atom].isotope = 0;
    s->atoms[atom].pin_pairs = s->atoms[atom].pin_odd = PIN_NONE;
    settle(s);
}

void species_set_order(struct species *s, int bond, int order)
{
    if (bond < 0 || bond >= s->n_bonds || order < 0 || order > 3)
        return;
    s->bonds[bond].order = order;
    s->bonds[bond].aromatic = false;
    HOLDS(s);
}

void species_set_place(struct species *s, int atom, int row, int col)
{
    if (atom < 0 || atom >= s->n_atoms)
        return;
    s->atoms[atom].row = row;
    s->atoms[atom].col = col;
    s->atoms[atom].placed = true;
}

void species_set_pins(struct species *s, int atom, int pairs, int odd)
{
    if (atom < 0 || atom >= s->n_atoms || pairs < PIN_NONE || pairs > 9 || odd < PIN_NONE || odd > 9)
        return;
    s->atoms[atom].pin_pairs = pairs;
    s->atoms[atom].pin_odd = odd;
}

static int between(int value, int low, int high) { return value < low ? low : value > high ? high : value; }

void species_set_charge(struct species *s, int charge)
{
    s->charge = between(charge, -SPECIES_CHARGE_MAX, SPECIES_CHARGE_MAX);
    s->charge_assumed = false;
    settle(s);
}

void species_set_multiplicity(struct species *s, int multiplicity)
{
    s->multiplicity = between(multiplicity, 1, SPECIES_MULTIPLICITY_MAX);
    s->multiplicity_assumed = false;
    HOLDS(s);
}

void species_assume_multiplicity(struct species *s)
{
    s->multiplicity_assumed = true;
    settle(s);
}

static void set_text(char **to, const char *text, size_t max)
{
    size_t length = strlen(text), i = 0;
    char *copy;

    /* Cut at a character, never inside one. */
    while (i < length && i < max) {
        unsigned code;
        size_t n = text_utf8(text + i, length - i, &code);

        if (i + (n ? n : 1) > max)
            break;
        i += n ? n : 1;
    }
    copy = alloc_text_n(text, i);
    alloc_free(*to);
    *to = copy;
}

void species_set_name(struct species *s, const char *name) { set_text(&s->name, name, SPECIES_NAME_MAX); }

void species_set_note(struct species *s, const char *note) { set_text(&s->note, note, SPECIES_NOTE_MAX); }

void species_add_stereo(struct species *s, const struct stereo *mark)
{
    s->stereo = alloc_resize(s->stereo, (size_t)s->n_stereo + 1, sizeof *s->stereo);
    s->stereo[s->n_stereo++] = *mark;
    HOLDS(s);
}

int species_bond_between(const struct species *s, int a, int b)
{
    int i, low = a < b ? a : b, high = a < b ? b : a;

    for (i = 0; i < s->n_bonds; i++)
        if (s->bonds[i].a == low && s->bonds[i].b == high)
            return i;
    return -1;
}

int species_degree(const struct species *s, int atom)
{
    int i, n = 0;

    for (i = 0; i < s->n_bonds; i++)
        n += s->bonds[i].a == atom || s->bonds[i].b == atom;
    return n;
}

int species_neighbours(const struct species *s, int atom, int *neighbours, int *bonds)
{
    int i, n = 0;

    for (i = 0; i < s->n_bonds && n < SPECIES_NEIGHBOURS_MAX; i++) {
        const struct bond *b = &s->bonds[i];

        if (b->a != atom && b->b != atom)
            continue;
        if (bonds)
            bonds[n] = i;
        neighbours[n++] = b->a == atom ? b->b : b->a;
    }
    return n;
}

int species_valence_electrons(const struct species *s)
{
    int i, sum = -s->charge;

    for (i = 0; i < s->n_atoms; i++) {
        int v = element_get(s->atoms[i].z)->valence;

        sum += v > 0 ? v : 0;
    }
    return sum;
}

int species_heavy_atoms(const struct species *s)
{
    int i, n = 0;

    for (i = 0; i < s->n_atoms; i++)
        n += s->atoms[i].z != 1;
    return n;
}

int species_lowest_multiplicity(const struct species *s)
{
    int e = species_valence_electrons(s);

    return e % 2 ? 2 : 1;
}

bool species_has_unknown_valence(const struct species *s)
{
    int i;

    for (i = 0; i < s->n_atoms; i++)
        if (element_get(s->atoms[i].z)->valence < 0)
            return true;
    return false;
}

int species_parts(const struct species *s, int *part)
{
    int i, n = 0;
    bool changed = true;

    for (i = 0; i < s->n_atoms; i++)
        part[i] = i;
    while (changed) {
        changed = false;
        for (i = 0; i < s->n_bonds; i++) {
            int *a = &part[s->bonds[i].a], *b = &part[s->bonds[i].b];

            if (*a == *b)
                continue;
            if (*a > *b)
                *a = *b;
            else
                *b = *a;
            changed = true;
        }
    }
    for (i = 0; i < s->n_atoms; i++)
        part[i] = part[i] == i ? n++ : part[part[i]];
    return n;
}

char *species_formula(const struct species *s)
{
    int counts[ELEMENT_Z_MAX + 1] = {0}, i, pass;
    const struct element *order[ELEMENT_Z_MAX];
    struct text t;

    for (i = 0; i < s->n_atoms; i++)
        counts[s->atoms[i].z]++;
    for (i = 0; i < ELEMENT_Z_MAX; i++) {
        const struct element *e = element_get(i + 1);
        int at = i;

        while (at > 0 && strcmp(order[at - 1]->symbol, e->symbol) > 0) {
            order[at] = order[at - 1];
            at--;
        }
        order[at] = e;
    }
    text_init(&t);
    /* Hill order: with carbon, C and H first; all others by symbol. */
    for (pass = 0; pass < 3; pass++)
        for (i = 0; i < ELEMENT_Z_MAX; i++) {
            int z = order[i]->z;
            int when = counts[6] ? (z == 6 ? 0 : z == 1 ? 1 : 2) : 2;

            if (!counts[z] || when != pass)
                continue;
            text_add(&t, order[i]->symbol);
            if (counts[z] > 1)
                text_addf(&t, "%d", counts[z]);
        }
    {
        char *formula = alloc_text(t.s);

        text_done(&t);
        return formula;
    }
}

void species_label(const struct species *s, int atom, char label[16])
{
    snprintf(label, 16, "%s%d", element_get(s->atoms[atom].z)->symbol, atom + 1);
}

const char *species_check(const struct species *s)
{
    int i, j;

    if (s->n_atoms < 0 || s->n_atoms > s->atoms_room || s->n_atoms > SPECIES_ATOMS_MAX)
        return "the number of atoms is out of range";
    for (i = 0; i < s->n_atoms; i++)
        if (!element_get(s->atoms[i].z))
            return "an atom has no element";
    for (i = 0; i < s->n_bonds; i++) {
        const struct bond *b = &s->bonds[i];

        if (b->a < 0 || b->b >= s->n_atoms || b->a >= b->b || b->order < 0 || b->order > 3)
            return "a bond is out of range";
        for (j = 0; j < i; j++)
            if (s->bonds[j].a == b->a && s->bonds[j].b == b->b)
                return "a bond is there twice";
    }
    for (i = 0; i < s->n_stereo; i++) {
        if (s->stereo[i].atom < 0 || s->stereo[i].atom >= s->n_atoms || s->stereo[i].n < 0 || s->stereo[i].n > 8)
            return "a stereo mark is out of range";
        for (j = 0; j < s->stereo[i].n; j++)
            if (s->stereo[i].neighbour[j] < STEREO_IMPLICIT_H || s->stereo[i].neighbour[j] >= s->n_atoms)
                return "a stereo neighbour is out of range";
    }
    if (!s->name || !s->note)
        return "a text is missing";
    if (s->multiplicity_assumed && s->multiplicity != species_lowest_multiplicity(s))
        return "an assumed multiplicity is not the lowest";
    return NULL;
}
