#include "config.h"

#include "lewis/order.h"

#include "base/alloc.h"

#include <string.h>

struct search {
    const struct problem *p;
    bool *done;
    int *slot;      /* [n_atoms], -1: not open */
    int *since;     /* [n_atoms] step at which it was opened */
    bool taken[ORDER_SLOTS_MAX];
};

static bool coupled(const struct problem *p, int bond) { return p->pi_high[bond] > 0; }

/* How many atoms more are open after visiting atom. */
static int growth(const struct search *g, int atom)
{
    const struct problem *p = g->p;
    int k, n = g->slot[atom] >= 0 ? -1 : 0;

    for (k = p->link_first[atom]; k < p->link_first[atom + 1]; k++) {
        int other = p->links[2 * k];

        if (coupled(p, p->links[2 * k + 1]) && !g->done[other] && g->slot[other] < 0)
            n++;
    }
    return n;
}

static int choose(const struct search *g)
{
    int best = -1, best_growth = 0, best_since = 0, i;
    bool any_open = false;

    for (i = 0; i < g->p->n_atoms; i++)
        any_open |= !g->done[i] && g->slot[i] >= 0;
    for (i = 0; i < g->p->n_atoms; i++) {
        int grow, k;
        bool near;

        if (g->done[i])
            continue;
        near = g->slot[i] >= 0;
        /* Stay near what is open: a leaf of an open atom counts as near, too. */
        for (k = g->p->link_first[i]; any_open && !near && k < g->p->link_first[i + 1]; k++)
            near = g->slot[g->p->links[2 * k]] >= 0 && !g->done[g->p->links[2 * k]];
        if (any_open && !near)
            continue;
        grow = growth(g, i);
        if (best < 0 || grow < best_growth || (grow == best_growth && g->since[i] < best_since)) {
            best = i;
            best_growth = grow;
            best_since = g->since[i];
        }
    }
    return best;
}

static bool open_slot(struct search *g, int atom, int when)
{
    int s;

    for (s = 0; s < ORDER_SLOTS_MAX; s++)
        if (!g->taken[s]) {
            g->taken[s] = true;
            g->slot[atom] = s;
            g->since[atom] = when;
            return true;
        }
    return false;
}

static bool visit(struct search *g, struct step *step, int atom, int when)
{
    const struct problem *p = g->p;
    int k;

    step->atom = atom;
    step->slot = g->slot[atom];
    step->n_later = 0;
    g->done[atom] = true;
    for (k = p->link_first[atom]; k < p->link_first[atom + 1]; k++) {
        int other = p->links[2 * k];

        if (!coupled(p, p->links[2 * k + 1]) || g->done[other])
            continue;
        if (g->slot[other] < 0 && !open_slot(g, other, when))
            return false;
        step->later_slot[step->n_later] = g->slot[other];
        step->later_bond[step->n_later++] = p->links[2 * k + 1];
    }
    if (g->slot[atom] >= 0) {
        g->taken[g->slot[atom]] = false;
        g->slot[atom] = -1;
    }
    return true;
}

bool order_make(const struct problem *p, struct step *steps)
{
    struct search g = {.p = p};
    bool fits = true;
    int i;

    g.done = NEW_ARRAY(bool, p->n_atoms);
    g.slot = NEW_ARRAY(int, p->n_atoms);
    g.since = NEW_ARRAY(int, p->n_atoms);
    for (i = 0; i < p->n_atoms; i++) {
        g.slot[i] = -1;
        g.since[i] = p->n_atoms;
    }
    for (i = 0; i < p->n_atoms && fits; i++)
        fits = visit(&g, &steps[i], choose(&g), i);
    alloc_free(g.done);
    alloc_free(g.slot);
    alloc_free(g.since);
    return fits;
}
