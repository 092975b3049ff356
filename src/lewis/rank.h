/* Ranking inside the contributing set, and classes of equivalent forms. */
#ifndef DW_LEWIS_RANK_H
#define DW_LEWIS_RANK_H

#include "lewis/lewis.h"

/* The ranking score of a form, lower is better; a declared heuristic, no weight:
 *     0.5 sum of charge * electronegativity     (negative charge on the more electronegative atom)
 *   + 1.0 for each pair of bonded atoms whose charges have one sign
 *   + 0.1 (bonds between them - 1) for each pair of opposite charges
 * after the order of preference in most texts (charges on the right atoms, like
 * charges apart, opposite ones near); the numbers are a choice of this program. */
double rank_score(const struct species *s, const struct form *f);

/* Sorts forms by score, equal ones by their orders and pairs, so that the order
 * never depends on how they were found. */
void rank_sort(const struct species *s, struct form *forms, int n);

/* Numbers the classes of forms that an automorphism of the skeleton carries into
 * one another, in order of first appearance; fills cls and alike; gives how many. */
int rank_classes(const struct species *s, struct form *forms, int n);

#endif
