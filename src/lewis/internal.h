/* Shared by the files of lewis/ and by nobody else. */
#ifndef DW_LEWIS_INTERNAL_H
#define DW_LEWIS_INTERNAL_H

#include "lewis/lewis.h"
#include "lewis/solve.h"

/* What the solver said about the species, kept for the findings. */
struct judgement {
    const struct species *species;
    const struct lewis_options *options;
    int odd;              /* odd electrons placed */
    bool parity_wrong;    /* the stated multiplicity cannot be had */
    bool relaxed;         /* the shown form breaks a shell */
    bool too_wide;        /* forms were not counted */
    bool compared;        /* best_* hold the cost of the best form (as drawn only) */
    int best_missing, best_charge;
    int missing, charge_sum, excess;  /* of the shown form */
};

void form_init(struct form *f, const struct species *s);
void form_done(struct form *f);
void form_copy(struct form *to, const struct form *from, const struct species *s); /* to is initialised here */

/* Adds a finding; atoms are copied. Takes text over. */
void finding_add(struct lewis *l, const char *code, enum severity severity, const int *atoms, int n_atoms, char *text);

/* All findings for the shown form, and the verdict. */
void findings_judge(struct lewis *l, const struct judgement *j);

/* Searches small edits that make a flawed species sound; fills l->mends. */
void mends_search(struct lewis *l, const struct species *s, const struct lewis_options *options);

/* Solves with the placement rule for odd electrons. */
enum solve_status odd_solve(const struct species *s, bool octet, int odd, struct problem *p, struct solution **solution,
                            bool **allowed);

#endif
