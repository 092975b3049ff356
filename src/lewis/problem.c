#include "config.h"

#include "lewis/solve.h"

#include "base/alloc.h"
#include "core/element.h"

#include <stdlib.h>
#include <string.h>

enum { ROOM_EXPANDED = 18, ROOM_RELAXED = 20 };

/* Bits of each term in a packed cost, 64 together: wide enough for
 * SPECIES_ATOMS_MAX bare atoms. */
static const int term_bits[COST_TERMS] = {12, 15, 14, 14, 9};

int problem_cost_of(const struct problem *p, uint64_t cost, enum cost_term term)
{
    return (int)(cost >> p->shift[term] & ((UINT64_C(1) << term_bits[term]) - 1));
}

/* Most significant first. */
static void set_priorities(struct problem *p)
{
    static const enum cost_term low_charge[] = {COST_OVERFULL, COST_MISSING, COST_CHARGE, COST_EXCESS, COST_ODD};
    static const enum cost_term octet[] = {COST_OVERFULL, COST_EXCESS, COST_MISSING, COST_CHARGE, COST_ODD};
    const enum cost_term *order = p->octet ? octet : low_charge;
    int i, at = 0;

    for (i = COST_TERMS - 1; i >= 0; i--) {
        p->shift[order[i]] = at;
        at += term_bits[order[i]];
    }
}

static void list_links(struct problem *p)
{
    const struct species *s = p->species;
    int *fill = NEW_ARRAY(int, p->n_atoms + 1), i;

    p->link_first = NEW_ARRAY(int, p->n_atoms + 1);
    p->links = NEW_ARRAY(int, 4 * p->n_bonds + 1);
    for (i = 0; i < s->n_bonds; i++) {
        p->link_first[s->bonds[i].a + 1]++;
        p->link_first[s->bonds[i].b + 1]++;
    }
    for (i = 0; i < p->n_atoms; i++) {
        p->link_first[i + 1] += p->link_first[i];
        fill[i] = p->link_first[i];
    }
    for (i = 0; i < s->n_bonds; i++) {
        int a = s->bonds[i].a, b = s->bonds[i].b;

        p->links[2 * fill[a]] = b;
        p->links[2 * fill[a]++ + 1] = i;
        p->links[2 * fill[b]] = a;
        p->links[2 * fill[b]++ + 1] = i;
    }
    alloc_free(fill);
}

/* True where an odd electron on the atom needs no excuse: it has two or more
 * neighbours and none of the heavy ones is less electronegative. */
static bool welcomes_odd(const struct problem *p, int atom)
{
    const struct species *s = p->species;
    double chi = element_get(s->atoms[atom].z)->chi;
    int k;

    if (p->sites[atom].sigma < 2)
        return false;
    for (k = p->link_first[atom]; k < p->link_first[atom + 1]; k++) {
        int z = s->atoms[p->links[2 * k]].z;

        if (z != 1 && element_get(z)->chi < chi)
            return false;
    }
    return true;
}

static void set_site(struct problem *p, int atom)
{
    const struct species *s = p->species;
    const struct element *e = element_get(s->atoms[atom].z);
    struct site *site = &p->sites[atom];
    int within, beyond;

    site->valence = e->valence > 0 ? e->valence : 0;
    site->sigma = p->link_first[atom + 1] - p->link_first[atom];
    site->target = element_shell_target(e->z);
    site->terminal = site->sigma <= 1;
    site->may_expand = element_may_expand(e->z) && !site->terminal;
    site->may_be_short = element_may_be_short(e->z);
    site->room = site->may_expand ? ROOM_EXPANDED : site->target;
    site->rank_odd = p->odd && !welcomes_odd(p, atom);
    within = (site->target - 2 * site->sigma) / 2;
    beyond = site->may_expand ? site->valence - site->sigma : 0;
    site->pi_max = within > beyond ? within : beyond;
    if (e->z <= 2 || e->group == 1 || (site->terminal && element_is_halogen(e->z)) || site->pi_max < 0 ||
        site->sigma == 0)
        site->pi_max = 0;
    if (p->relaxed || site->pi_max > SITE_PI_MAX)
        site->pi_max = SITE_PI_MAX;
}

static void set_bonds(struct problem *p, enum drawn_use drawn)
{
    const struct species *s = p->species;
    int i;

    for (i = 0; i < s->n_bonds; i++) {
        const struct bond *b = &s->bonds[i];
        int most = p->sites[b->a].pi_max < p->sites[b->b].pi_max ? p->sites[b->a].pi_max : p->sites[b->b].pi_max;

        p->pi_low[i] = 0;
        p->pi_high[i] = (signed char)(most < PI_MAX ? most : PI_MAX);
        if (drawn == DRAWN_FIX && b->aromatic) {
            p->pi_high[i] = 1;
        } else if (drawn == DRAWN_FIX) {
            p->pi_low[i] = p->pi_high[i] = (signed char)(b->order > 1 ? b->order - 1 : 0);
        }
    }
}

/* Gives false where the atom may not hold this. */
static bool make_option(const struct problem *p, int atom, int pi, int pairs, int odd, struct site_option *o)
{
    const struct site *site = &p->sites[atom];
    const struct atom *a = &p->species->atoms[atom];
    int shell = 2 * (site->sigma + pi + pairs) + odd;
    int charge = site->valence - 2 * pairs - odd - site->sigma - pi;
    int missing = shell < site->target && !site->may_be_short ? site->target - shell : 0;
    int excess = shell > site->target ? shell - site->target : 0;
    int over = shell > site->room ? shell - site->room : 0;

    if ((a->pin_pairs >= 0 && a->pin_pairs != pairs) || (a->pin_odd >= 0 && a->pin_odd != odd))
        return false;
    if (odd && p->odd_allowed && !p->odd_allowed[atom])
        return false;
    /* One orbital for each bond, pair and odd electron: four for s and p. */
    if (!p->relaxed && (over || site->sigma + pi + pairs + odd > site->room / 2))
        return false;
    o->expanded = pi > 0 && shell > 8;
    if (o->expanded && charge < 0 && !p->relaxed)
        return false;
    if (odd && p->odd_free)
        missing = 0;
    o->lone_pairs = (signed char)pairs;
    o->odd = (signed char)odd;
    o->charge = (signed char)charge;
    o->cost = (uint64_t)over << p->shift[COST_OVERFULL] | (uint64_t)missing << p->shift[COST_MISSING] |
              (uint64_t)abs(charge) << p->shift[COST_CHARGE] | (uint64_t)excess << p->shift[COST_EXCESS] |
              (uint64_t)(site->rank_odd ? odd : 0) << p->shift[COST_ODD];
    return true;
}

static void list_options(struct problem *p, int atom)
{
    struct site *site = &p->sites[atom];
    struct site_option scratch[SITE_OPTIONS_MAX];
    int room = p->relaxed ? ROOM_RELAXED : site->room, pi, pairs, odd, n = 0;

    if (p->relaxed && site->target == 2)
        room = 8;
    for (pi = 0; pi <= SITE_PI_MAX; pi++) {
        site->first[pi] = n;
        if (pi > site->pi_max)
            continue;
        for (odd = 0; odd <= p->odd && odd <= 6; odd++)
            for (pairs = 0; 2 * (site->sigma + pi + pairs) + odd <= (p->relaxed && 2 * (site->sigma + pi) > room
                                                                          ? 2 * (site->sigma + pi) : room);
                 pairs++)
                if (n < SITE_OPTIONS_MAX && make_option(p, atom, pi, pairs, odd, &scratch[n]))
                    n++;
    }
    site->first[SITE_PI_MAX + 1] = n;
    site->n_options = n;
    site->options = NEW_ARRAY(struct site_option, n);
    memcpy(site->options, scratch, (size_t)n * sizeof *scratch);
}

void problem_init(struct problem *p, const struct species *s, const struct problem_setup *setup)
{
    int i;

    memset(p, 0, sizeof *p);
    p->species = s;
    p->n_atoms = s->n_atoms;
    p->n_bonds = s->n_bonds;
    p->charge = s->charge;
    p->odd = setup->odd;
    p->octet = setup->octet;
    p->relaxed = setup->relaxed;
    p->odd_allowed = setup->odd_allowed;
    p->odd_free = setup->odd_free;
    p->pi_low = NEW_ARRAY(signed char, s->n_bonds);
    p->pi_high = NEW_ARRAY(signed char, s->n_bonds);
    p->sites = NEW_ARRAY(struct site, s->n_atoms);
    set_priorities(p);
    list_links(p);
    for (i = 0; i < s->n_atoms; i++)
        set_site(p, i);
    set_bonds(p, setup->drawn);
    for (i = 0; i < s->n_atoms; i++)
        list_options(p, i);
}

void problem_done(struct problem *p)
{
    int i;

    for (i = 0; i < p->n_atoms; i++)
        alloc_free(p->sites[i].options);
    alloc_free(p->sites);
    alloc_free(p->pi_low);
    alloc_free(p->pi_high);
    alloc_free(p->links);
    alloc_free(p->link_first);
}
