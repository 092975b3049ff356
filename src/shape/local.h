/* The surroundings of one atom as the domain model gives them: the target that
 * the placement of the whole species works towards. */
#ifndef DW_SHAPE_LOCAL_H
#define DW_SHAPE_LOCAL_H

#include "core/species.h"
#include "lewis/lewis.h"
#include "shape/shape.h"

#include <stdbool.h>

enum { LOCAL_LOBES_MAX = 6 };

struct local {
    int n;                                      /* neighbours, in the order of species_neighbours */
    int neighbour[SPECIES_NEIGHBOURS_MAX];
    int bond[SPECIES_NEIGHBOURS_MAX];
    double direction[SPECIES_NEIGHBOURS_MAX][3];/* unit vectors to the neighbours, a frame of its own */
    int n_lobes;
    double lobe[LOCAL_LOBES_MAX][3];            /* unit vectors of lone pairs and odd electrons, same frame */
    bool lobe_odd[LOCAL_LOBES_MAX];
    bool flat;                                  /* conjugated or pi-bonded: wants its neighbours in one plane */
    double energy;                              /* of the model, its own units */
    double expected_error;                      /* degrees, of an angle here */
};

/* Fills one struct local per atom (array of s->n_atoms) and centres[n_atoms].
 * length[n_bonds] in ångström comes from lengths_estimate. Deterministic. */
void local_solve(const struct species *s, const struct lewis *low, const double *length, struct local *local,
                 struct centre *centres);

/* Bond lengths and their expected errors, ångström; both arrays [n_bonds]. */
void lengths_estimate(const struct species *s, const struct lewis *low, double *length, double *error);

/* Coordinates (xyz[n_atoms], ångström) that follow length and the local angles:
 * rings closed, single bonds staggered, double and conjugated ones flat, stereo
 * marks kept, no atoms closer than a sane contact. Atoms that are not bonded to
 * one another (several parts) are set apart. Gives false where there is nothing
 * to place. Deterministic. */
bool place_atoms(const struct species *s, const struct lewis *low, const double *length, const struct local *local,
                 double (*xyz)[3]);

#endif
