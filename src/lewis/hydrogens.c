#include "config.h"

#include "core/element.h"
#include "lewis/lewis.h"

/* Usual valences, lowest first, 0 ends: common practice, as in the OpenSMILES
 * specification for its organic subset, carried down the groups. */
static const int *usual_valences(int z)
{
    static const int none[] = {0}, three[] = {3, 0}, four[] = {4, 0}, three_five[] = {3, 5, 0}, two[] = {2, 0},
                     two_four_six[] = {2, 4, 6, 0}, one[] = {1, 0};
    const struct element *e = element_get(z);

    if (e->block != 'p')
        return none;
    switch (e->group) {
    case 13: return three;
    case 14: return four;
    case 15: return e->period == 2 ? three : three_five;
    case 16: return e->period == 2 ? two : two_four_six;
    case 17: return one;
    default: return none;
    }
}

/* Twice the sum of the drawn orders, so that aromatic bonds count one and a half. */
static int drawn_twice(const struct species *s, int atom)
{
    int i, sum = 0;

    for (i = 0; i < s->n_bonds; i++) {
        const struct bond *b = &s->bonds[i];

        if (b->a == atom || b->b == atom)
            sum += b->aromatic ? 3 : 2 * (b->order > 0 ? b->order : 1);
    }
    return sum;
}

static int wanted(const struct species *s, int atom)
{
    const int *v;
    int sum = (drawn_twice(s, atom) + 1) / 2;

    for (v = usual_valences(s->atoms[atom].z); *v; v++)
        if (*v >= sum)
            return *v - sum;
    return 0;
}

static bool add_one(struct species *s, int atom)
{
    int h = species_add_atom(s, 1);

    if (h < 0)
        return false;
    if (species_add_bond(s, atom, h, 1) >= 0)
        return true;
    species_remove_atom(s, h);
    return false;
}

static int hydrogens_on(const struct species *s, int atom, int *one)
{
    int near[SPECIES_NEIGHBOURS_MAX], n = species_neighbours(s, atom, near, NULL), i, found = 0;

    for (i = 0; i < n; i++)
        if (s->atoms[near[i]].z == 1 && species_degree(s, near[i]) == 1) {
            *one = near[i];
            found++;
        }
    return found;
}

/* A positive net charge is an extra hydrogen on the most basic atom: group 15
 * before 16, fewest hydrogens first. */
static int most_basic(const struct species *s, int n_atoms)
{
    int i, best = -1, best_value = 0;

    for (i = 0; i < n_atoms; i++) {
        const struct element *e = element_get(s->atoms[i].z);
        int value = e->group == 15 ? 200 : e->group == 16 ? 100 : 0;

        if (value && value - species_degree(s, i) > best_value) {
            best = i;
            best_value = value - species_degree(s, i);
        }
    }
    return best;
}

/* A negative one is a hydrogen missing on the most electronegative atom that has any. */
static int most_acidic(const struct species *s, int n_atoms)
{
    int i, best = -1, h;

    for (i = 0; i < n_atoms; i++)
        if (s->atoms[i].z != 1 && hydrogens_on(s, i, &h) > 0 &&
            (best < 0 || element_get(s->atoms[i].z)->chi > element_get(s->atoms[best].z)->chi))
            best = i;
    return best;
}

int lewis_fill_hydrogens(struct species *s)
{
    int heavy = s->n_atoms, i, k, added = 0;

    for (i = 0; i < heavy; i++)
        for (k = s->atoms[i].z == 1 ? 0 : wanted(s, i); k > 0; k--)
            added += add_one(s, i);
    for (k = s->charge; k > 0 && added > 0; k--) {
        int atom = most_basic(s, heavy);

        if (atom < 0)
            break;
        added += add_one(s, atom);
    }
    for (k = s->charge; k < 0 && added > 0; k++) {
        int atom = most_acidic(s, heavy), h = -1;

        if (atom < 0 || !hydrogens_on(s, atom, &h) || h < heavy)
            break;
        species_remove_atom(s, h);
        added--;
    }
    return added;
}
