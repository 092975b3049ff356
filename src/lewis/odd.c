#include "config.h"

#include "base/alloc.h"
#include "core/element.h"
#include "lewis/internal.h"

#include <string.h>

/* Two or more neighbours, and less electronegative than each of them, hydrogen
 * aside; at least one neighbour must not be hydrogen. */
static bool is_candidate(const struct species *s, int atom)
{
    int near[SPECIES_NEIGHBOURS_MAX], n = species_neighbours(s, atom, near, NULL), i, heavy = 0;
    double chi = element_get(s->atoms[atom].z)->chi;

    for (i = 0; i < n; i++) {
        if (s->atoms[near[i]].z == 1)
            continue;
        heavy++;
        if (element_get(s->atoms[near[i]].z)->chi <= chi)
            return false;
    }
    return n >= 2 && heavy > 0;
}

/* Is there a form with the odd electron on an allowed atom and every other shell complete? */
static bool completes(const struct species *s, bool octet, const bool *allowed)
{
    struct problem_setup setup = {.octet = octet, .odd = 1, .odd_allowed = allowed, .odd_free = true};
    struct problem p;
    struct solution *solution = NULL;
    bool complete;

    problem_init(&p, s, &setup);
    complete = problem_solve(&p, &solution) == SOLVE_FOUND &&
               problem_cost_of(&p, solution_cost(solution), COST_MISSING) == 0;
    solution_free(solution);
    problem_done(&p);
    return complete;
}

enum solve_status odd_solve(const struct species *s, bool octet, int odd, struct problem *p, struct solution **solution,
                            bool **allowed)
{
    struct problem_setup setup = {.octet = octet, .odd = odd};
    bool any = false;
    int i;

    *allowed = NULL;
    if (odd == 1) {
        bool *one = NEW_ARRAY(bool, s->n_atoms);

        *allowed = NEW_ARRAY(bool, s->n_atoms);
        for (i = 0; i < s->n_atoms; i++) {
            if (!is_candidate(s, i))
                continue;
            memset(one, 0, (size_t)s->n_atoms * sizeof *one);
            one[i] = true;
            (*allowed)[i] = completes(s, octet, one);
            any |= (*allowed)[i];
        }
        alloc_free(one);
        if (any) {
            setup.odd_allowed = *allowed;
            setup.odd_free = true;
        }
    }
    problem_init(p, s, &setup);
    return problem_solve(p, solution);
}
