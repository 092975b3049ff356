/* Hazard-bearing patterns of a structure: plain cautions that name the pattern
 * and defer to the safety data sheet. Absence of one says nothing about safety. */
#ifndef DW_ENGINE_CAUTION_H
#define DW_ENGINE_CAUTION_H

#include "core/species.h"
#include "engine/answer.h"

/* Gives a list of *n cautions (NULL where none); the caller frees each text and the list. */
struct caution *caution_find(const struct species *s, const struct lewis *low, int *n);

#endif
