#include "config.h"

#include "base/alloc.h"
#include "base/text.h"
#include "core/element.h"
#include "lewis/internal.h"

#include <stdarg.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

void finding_add(struct lewis *l, const char *code, enum severity severity, const int *atoms, int n_atoms, char *text)
{
    struct finding *f;

    l->findings = alloc_resize(l->findings, (size_t)l->n_findings + 1, sizeof *l->findings);
    f = &l->findings[l->n_findings++];
    f->code = code;
    f->severity = severity;
    f->n_atoms = n_atoms;
    f->atoms = NEW_ARRAY(int, n_atoms);
    if (n_atoms)
        memcpy(f->atoms, atoms, (size_t)n_atoms * sizeof *atoms);
    f->text = text;
}

/* printf into a new string. */
static char *say(const char *format, ...) __attribute__((format(printf, 1, 2)));

static char *say(const char *format, ...)
{
    char buffer[600];
    va_list args;

    va_start(args, format);
    vsnprintf(buffer, sizeof buffer, format, args);
    va_end(args);
    return alloc_text(buffer);
}

/* "S1, O2 and O3", at most six named. */
static void name_atoms(const struct species *s, const int *atoms, int n, char *out, size_t size)
{
    struct text t;
    int i, shown = n > 6 ? 6 : n;

    text_init(&t);
    for (i = 0; i < shown; i++) {
        char label[16];

        species_label(s, atoms[i], label);
        text_addf(&t, "%s%s", i == 0 ? "" : i + 1 == n ? " and " : ", ", label);
    }
    if (n > shown)
        text_addf(&t, " and %d more", n - shown);
    snprintf(out, size, "%s", t.s);
    text_done(&t);
}

static void judge_electrons(struct lewis *l, const struct judgement *j, bool beyond)
{
    const struct species *s = j->species;

    if (l->available < 0) {
        finding_add(l, "charge-impossible", SEVERITY_ERROR, NULL, 0,
                    say("A charge of %+d takes away more than the %d valence electrons there are: lower the charge.",
                        s->charge, l->available + s->charge));
        return;
    }
    if (j->parity_wrong)
        finding_add(l, "parity", SEVERITY_ERROR, NULL, 0,
                    say("%d electrons cannot leave %d unpaired (multiplicity %d): change the charge by one, or take "
                        "multiplicity %d.", l->available, s->multiplicity - 1, s->multiplicity,
                        species_lowest_multiplicity(s)));
    if (j->too_wide) {
        finding_add(l, "too-wide", SEVERITY_WARNING, NULL, 0,
                    say("The conjugated part is too large to count its forms here: the form shown is one as drawn, and "
                        "the mean bond orders are its own."));
    } else if (beyond) {
        return;
    } else if (!l->has_form && l->available < 2 * l->n_bonds) {
        finding_add(l, "too-few-electrons", SEVERITY_ERROR, NULL, 0,
                    say("%d electrons are too few for %d bonds, which need %d: take away a bond or an atom, or lower the "
                        "charge.", l->available, l->n_bonds, 2 * l->n_bonds));
    } else if (!l->has_form) {
        finding_add(l, "no-form", SEVERITY_ERROR, NULL, 0,
                    say("No arrangement of %d electrons fits this skeleton with multiplicity %d%s.", l->available,
                        s->multiplicity, s->n_atoms ? " and the pinned electrons" : ""));
    }
}

/* Bonds of a hydrogen to several atoms. */
static bool judge_bridges(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    bool beyond = false;
    int i, k;

    for (i = 0; i < s->n_atoms; i++) {
        int near[SPECIES_NEIGHBOURS_MAX], n, poor = 0, rich = 0, atoms[1 + SPECIES_NEIGHBOURS_MAX];
        char names[80];

        if (s->atoms[i].z != 1 || (n = species_neighbours(s, i, near, NULL)) < 2)
            continue;
        atoms[0] = i;
        for (k = 0; k < n; k++) {
            const struct element *e = element_get(s->atoms[near[k]].z);

            poor += element_may_be_short(e->z);
            rich += e->group == 17 || e->group == 16;
            atoms[k + 1] = near[k];
        }
        name_atoms(s, near, n, names, sizeof names);
        if (poor == n || rich == n) {
            finding_add(l, "three-centre", SEVERITY_ERROR, atoms, n + 1,
                        say("H%d bridges %s: a three-centre bond, which no two-centre Lewis form describes.", i + 1,
                            names));
            beyond = true;
        } else {
            finding_add(l, "hydrogen-bonds", SEVERITY_ERROR, atoms, n + 1,
                        say("H%d has %d bonds (to %s) and can hold one: take away a bond.", i + 1, n, names));
        }
    }
    return beyond;
}

static void judge_shells(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    int i;

    for (i = 0; l->has_form && i < s->n_atoms; i++) {
        const struct element *e = element_get(s->atoms[i].z);
        int target = element_shell_target(e->z), missing = target - l->shell[i], room = target;
        char label[16];

        species_label(s, i, label);
        if (element_may_expand(e->z) && species_degree(s, i) > 1)
            room = 18;
        if (l->shell[i] > room && !(e->z == 1 && species_degree(s, i) > 1)) {
            finding_add(l, "overfull-shell", SEVERITY_ERROR, &i, 1,
                        say("%s has %d electrons and can hold %d: take away a bond or %d electron%s.", label,
                            l->shell[i], room, l->shell[i] - room, l->shell[i] - room == 1 ? "" : "s"));
        } else if (missing > l->shown.unpaired[i] && !element_may_be_short(e->z) && !j->too_wide) {
            bool usual = e->group == 14 || e->group == 15 || e->z == 1 || (j->compared && j->missing > j->best_missing);

            if (j->compared && j->missing > j->best_missing)
                usual = false;
            finding_add(l, "short-shell", usual ? SEVERITY_WARNING : SEVERITY_ERROR, &i, 1,
                        say("%s has %d electrons of %d: %s.", label, l->shell[i], target,
                            usual ? "an open shell, reactive; right only for a cation, carbene or nitrene that is meant"
                                  : "add electrons (a lower charge), a bond or a hydrogen"));
        } else if (l->shell[i] > target) {
            finding_add(l, "expanded-shell", SEVERITY_NOTE, &i, 1,
                        say("%s holds %d electrons: counting past eight stands for polar and three-centre bonds, not "
                            "for d orbitals.", label, l->shell[i]));
        }
    }
}

static void judge_charges(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    int i;

    for (i = 0; l->has_form && i < s->n_bonds; i++) {
        int pair[2] = {s->bonds[i].a, s->bonds[i].b};
        int qa = l->shown.formal_charge[pair[0]], qb = l->shown.formal_charge[pair[1]];
        double ca = element_get(s->atoms[pair[0]].z)->chi, cb = element_get(s->atoms[pair[1]].z)->chi;
        char a[16], b[16];

        species_label(s, pair[0], a);
        species_label(s, pair[1], b);
        if (qa * qb > 0)
            finding_add(l, "like-charges", SEVERITY_WARNING, pair, 2,
                        say("%s and %s are neighbours with formal charges %+d and %+d of one sign.", a, b, qa, qb));
        else if (qa * qb < 0 && (qa > 0 ? ca > cb : cb > ca) && ca > 0 && cb > 0)
            finding_add(l, "charge-misplaced", SEVERITY_NOTE, pair, 2,
                        say("%s is more electronegative than %s and carries the positive formal charge.",
                            qa > 0 ? a : b, qa > 0 ? b : a));
    }
    if (j->compared && (j->missing > j->best_missing || j->charge_sum > j->best_charge))
        finding_add(l, "better-form", j->missing > j->best_missing ? SEVERITY_ERROR : SEVERITY_NOTE, NULL, 0,
                    j->missing > j->best_missing
                        ? say("Another form has fuller shells: %d electrons missing there, %d here.", j->best_missing,
                              j->missing)
                        : say("Another form has less formal charge: a sum of %d there, %d here.", j->best_charge,
                              j->charge_sum));
}

static void judge_odd(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    int *atoms = NEW_ARRAY(int, s->n_atoms), i, n = 0;
    char names[120];

    for (i = 0; l->has_form && i < s->n_atoms; i++)
        if (l->shown.unpaired[i])
            atoms[n++] = i;
    if (n) {
        name_atoms(s, atoms, n, names, sizeof names);
        finding_add(l, "odd-electron", SEVERITY_NOTE, atoms, n,
                    say("%d unpaired electron%s, shown on %s: an open-shell job.", l->unpaired,
                        l->unpaired == 1 ? "" : "s", names));
    }
    alloc_free(atoms);
}

/* Ground states that are not of the lowest multiplicity, well established (Huber
 * and Herzberg, Constants of Diatomic Molecules, 1979; CH2: Herzberg 1959 on), here
 * from memory. Hill formula, charge, multiplicity of the ground state. */
static const struct {
    const char *formula;
    int charge, multiplicity;
} ground_states[] = {
    {"O2", 0, 3}, {"S2", 0, 3},  {"OS", 0, 3},  {"Se2", 0, 3}, {"Te2", 0, 3}, {"B2", 0, 3},  {"Si2", 0, 3},
    {"HN", 0, 3}, {"HP", 0, 3},  {"HO", 1, 3},  {"CH2", 0, 3}, {"C", 0, 3},   {"Si", 0, 3},  {"O", 0, 3},
    {"S", 0, 3},  {"N", 0, 4},   {"P", 0, 4},   {"H2N", 1, 3}, {"ClN", 0, 3}, {"FN", 0, 3},  {"BrN", 0, 3},
};

static void judge_ground_state(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    char *formula = species_formula(s);
    size_t i;

    for (i = 0; i < sizeof ground_states / sizeof *ground_states; i++)
        if (s->charge == ground_states[i].charge && s->multiplicity != ground_states[i].multiplicity &&
            strcmp(formula, ground_states[i].formula) == 0)
            finding_add(l, "ground-state", SEVERITY_WARNING, NULL, 0,
                        say("The known ground state of %s has multiplicity %d, not %d: state the multiplicity you mean.",
                            formula, ground_states[i].multiplicity, s->multiplicity));
    alloc_free(formula);
}

/* Centres to which the rules are not made. True where the verdict is beyond. */
static bool judge_metals(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    bool beyond = false;
    int i;

    for (i = 0; i < s->n_atoms; i++) {
        const struct element *e = element_get(s->atoms[i].z);
        char label[16];

        species_label(s, i, label);
        if (e->valence < 0) {
            finding_add(l, "f-block", SEVERITY_ERROR, &i, 1,
                        say("%s is a lanthanide: its f electrons are outside this electron count.", label));
            beyond = true;
        } else if (e->block == 'd' && e->group < 12 && l->has_form &&
                   (l->shown.lone_pairs[i] || l->shown.unpaired[i])) {
            finding_add(l, "d-block", SEVERITY_ERROR, &i, 1,
                        say("%s keeps %d d electrons: neither the eight-electron count nor domain repulsion describes "
                            "it; take its spin and shape from ligand-field knowledge or experiment.", label,
                            2 * l->shown.lone_pairs[i] + l->shown.unpaired[i]));
            beyond = true;
        } else if (e->block == 'd' && e->group < 12) {
            finding_add(l, "d-block-empty", SEVERITY_NOTE, &i, 1,
                        say("%s has no d electrons left in this count: halides and oxides usually follow domain "
                            "repulsion, alkyls and hydrides often do not.", label));
        } else if (e->period == 6 && e->block == 'p' && l->has_form && l->shown.lone_pairs[i] && e->group < 16) {
            finding_add(l, "inert-pair", SEVERITY_WARNING, &i, 1,
                        say("The lone pair of %s may be inert: the predicted bend can be wrong.", label));
        }
    }
    return beyond;
}

/* Electron-poor cages: fewer electrons than two a bond, on elements that form them. */
static bool judge_cluster(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    int i;

    if (l->available < 0 || l->available >= 2 * l->n_bonds)
        return false;
    for (i = 0; i < s->n_atoms; i++) {
        const struct element *e = element_get(s->atoms[i].z);

        if ((e->group == 13 || e->group == 2 || e->group == 1) && e->z > 1 && species_degree(s, i) > 3) {
            finding_add(l, "cluster", SEVERITY_ERROR, &i, 1,
                        say("%d electrons for %d contacts: bonding over more than two centres, which no two-centre Lewis "
                            "form describes.", l->available, l->n_bonds));
            return true;
        }
    }
    return false;
}

static void judge_ionic(struct lewis *l, const struct judgement *j)
{
    const struct species *s = j->species;
    int i;

    for (i = 0; i < s->n_bonds; i++) {
        const struct element *a = element_get(s->atoms[s->bonds[i].a].z), *b = element_get(s->atoms[s->bonds[i].b].z);
        const struct element *metal = a->group == 1 && a->z > 1 ? a : b;
        const struct element *other = metal == a ? b : a;

        /* Over 1.7 on the Pauling scale: common practice. */
        if (metal->group == 1 && metal->z > 1 && other->chi - metal->chi > 1.7) {
            int pair[2] = {s->bonds[i].a, s->bonds[i].b};

            finding_add(l, "ionic", SEVERITY_NOTE, pair, 2,
                        say("The bond of %s and %s is ionic: an ion pair, written here with a line.", metal->name,
                            other->name));
        }
    }
}

static int by_severity(const void *a, const void *b)
{
    const struct finding *x = a, *y = b;

    if (x->severity != y->severity)
        return x->severity > y->severity ? -1 : 1;
    return 0;
}

/* Stable: qsort is not, so few findings are sorted by insertion. */
static void sort_findings(struct lewis *l)
{
    int i, k;

    for (i = 1; i < l->n_findings; i++) {
        struct finding f = l->findings[i];

        for (k = i; k > 0 && by_severity(&l->findings[k - 1], &f) > 0; k--)
            l->findings[k] = l->findings[k - 1];
        l->findings[k] = f;
    }
}

void findings_judge(struct lewis *l, const struct judgement *j)
{
    bool beyond, errors = false;
    int i;

    if (j->species->n_atoms == 0) {
        finding_add(l, "no-atoms", SEVERITY_ERROR, NULL, 0, say("There are no atoms yet: type an element symbol."));
        l->verdict = VERDICT_FLAWED;
        return;
    }
    beyond = judge_bridges(l, j);
    beyond |= judge_cluster(l, j);
    beyond |= judge_metals(l, j);
    judge_electrons(l, j, beyond);
    judge_shells(l, j);
    judge_charges(l, j);
    judge_odd(l, j);
    judge_ground_state(l, j);
    judge_ionic(l, j);
    sort_findings(l);
    for (i = 0; i < l->n_findings; i++)
        errors |= l->findings[i].severity == SEVERITY_ERROR;
    /* What breaks the electron count of a known kind of bonding outside the rules is beyond, not wrong. */
    l->verdict = beyond ? VERDICT_BEYOND : errors ? VERDICT_FLAWED : VERDICT_SOUND;
}
