/* Undo and redo without limit: a line of species states. */
#ifndef DW_ENGINE_HISTORY_H
#define DW_ENGINE_HISTORY_H

#include "core/species.h"

#include <stdbool.h>

struct history;

struct history *history_new(void);
void history_free(struct history *h);
/* Records the state before a change (a copy); forgets what could be redone. */
void history_mark(struct history *h, const struct species *before);
/* Swaps *s (owned) with the earlier or later state; false where there is none. */
bool history_undo(struct history *h, struct species **s);
bool history_redo(struct history *h, struct species **s);

#endif
