/* The order in which the solver visits the atoms, and the slots that open atoms
 * take in its states. */
#ifndef DW_LEWIS_ORDER_H
#define DW_LEWIS_ORDER_H

#include "lewis/solve.h"

#include <stdbool.h>

enum { ORDER_SLOTS_MAX = 16 };

struct step {
    int atom;
    int slot;                       /* the atom's own slot, -1: it was not open before */
    int n_later;                    /* neighbours that come later and may share pi with it */
    int later_slot[SPECIES_NEIGHBOURS_MAX];
    int later_bond[SPECIES_NEIGHBOURS_MAX];
};

/* Fills steps[n_atoms]. Greedy: next comes the atom that leaves fewest atoms
 * open (ties: the one open longest, then the lowest index). False where more
 * than ORDER_SLOTS_MAX atoms would be open at once. */
bool order_make(const struct problem *p, struct step *steps);

#endif
