/* The exact solver under the Lewis engine: all electron arrangements of least
 * cost, counted without listing them.
 *
 * Every bond b carries pi[b] extra pairs (0..2) on top of its single bond, every
 * atom some lone pairs and odd electrons. An atom's cost depends only on its own
 * numbers, and atoms meet only through the bonds between them, so one pass over
 * the atoms in a good order, remembering for each atom that is still open how
 * many pi pairs it has received, finds the least cost and the number of ways to
 * reach it (dynamic programming over a path decomposition):
 *
 *     start: one state, nothing received, charge 0, cost 0, count 1
 *     for each atom in order
 *         for each state, each choice of pi towards later neighbours,
 *                         each (lone pairs, odd electrons) the atom then may have
 *             add cost, formal charge, odd electrons; hand the pi on
 *             merge equal states: keep the least cost, add up its counts
 *     end: the state whose charge is the net charge, all odd electrons placed
 *
 * A second pass backwards gives in how many least-cost arrangements each single
 * choice takes part, hence exact means. What is still to come must bring the
 * charge to the net charge, so partial charge bounds the cost from below; budgets
 * grow until an arrangement is found. */
#ifndef DW_LEWIS_SOLVE_H
#define DW_LEWIS_SOLVE_H

#include "base/count.h"
#include "core/species.h"

#include <stdbool.h>
#include <stdint.h>

/* What is counted, each summed over the atoms. */
enum cost_term {
    COST_OVERFULL, /* electrons above what the atom can hold; 0 but where relaxed */
    COST_MISSING,  /* electrons missing from shells that count */
    COST_CHARGE,   /* |formal charge| */
    COST_EXCESS,   /* electrons past eight */
    COST_ODD,      /* odd electrons where another place is preferred */
    COST_TERMS
};

enum { PI_MAX = 2, SITE_OPTIONS_MAX = 512, SITE_PI_MAX = 6 };

struct site_option {
    signed char lone_pairs, odd, charge;
    bool expanded;               /* past eight with a pi bond */
    uint64_t cost;               /* packed, see problem.shift */
};

struct site {                    /* one per atom */
    int valence, sigma, target, room;
    bool terminal, may_expand, may_be_short, rank_odd;
    int pi_max;
    int first[SITE_PI_MAX + 2];  /* options for p pi pairs: first[p] .. first[p + 1] - 1 */
    int n_options;
    struct site_option *options;
};

struct problem {
    const struct species *species;
    int n_atoms, n_bonds;
    int charge;                  /* sum of formal charges to reach */
    int odd;                     /* odd electrons to place */
    bool octet;                  /* least expansion first */
    bool relaxed;                /* shells may overflow at a cost, placement rules are off */
    const bool *odd_allowed;     /* [n_atoms] or NULL: where odd electrons may sit */
    bool odd_free;               /* the shell that holds the odd electron counts as complete */
    signed char *pi_low;         /* [n_bonds] least extra pairs */
    signed char *pi_high;        /* [n_bonds] most */
    struct site *sites;          /* [n_atoms] */
    int *links;                  /* neighbours and bonds of atom i: pairs from link_first[i] */
    int *link_first;             /* [n_atoms + 1] */
    int shift[COST_TERMS];       /* bit position of each term in a packed cost */
};

/* How the orders as drawn enter. */
enum drawn_use { DRAWN_IGNORE, DRAWN_FIX };

struct problem_setup {
    bool octet, relaxed;
    enum drawn_use drawn;
    int odd;
    const bool *odd_allowed;
    bool odd_free;
};

void problem_init(struct problem *p, const struct species *s, const struct problem_setup *setup);
void problem_done(struct problem *p);
int problem_cost_of(const struct problem *p, uint64_t cost, enum cost_term term);

struct solution;

enum solve_status { SOLVE_FOUND, SOLVE_NONE, SOLVE_TOO_WIDE };

/* The caller frees *solution (NULL unless SOLVE_FOUND). The problem must outlive it. */
enum solve_status problem_solve(const struct problem *p, struct solution **solution);
void solution_free(struct solution *s);

uint64_t solution_cost(const struct solution *s);
const struct count *solution_count(const struct solution *s);
/* Means over all least-cost arrangements; any array may be NULL. */
void solution_means(const struct solution *s, double *pi, double *lone_pairs, double *odd);

/* One arrangement in the caller's arrays. */
struct arrangement {
    signed char *pi, *lone_pairs, *odd;
};
/* Calls visit for up to max arrangements in a fixed order; gives how many. The
 * arrays are the solver's and change between calls. */
long solution_visit(const struct solution *s, long max, void (*visit)(const struct arrangement *, void *), void *data);

#endif
