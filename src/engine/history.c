#include "config.h"

#include "engine/history.h"

#include "base/alloc.h"

struct stack {
    struct species **states;
    size_t n, room;
};

struct history {
    struct stack undo, redo;
};

static void push(struct stack *k, struct species *s)
{
    if (k->n == k->room) {
        k->room = k->room ? 2 * k->room : 16;
        k->states = alloc_resize(k->states, k->room, sizeof *k->states);
    }
    k->states[k->n++] = s;
}

static void empty(struct stack *k)
{
    while (k->n)
        species_free(k->states[--k->n]);
}

struct history *history_new(void) { return NEW(struct history); }

void history_free(struct history *h)
{
    if (!h)
        return;
    empty(&h->undo);
    empty(&h->redo);
    alloc_free(h->undo.states);
    alloc_free(h->redo.states);
    alloc_free(h);
}

void history_mark(struct history *h, const struct species *before)
{
    empty(&h->redo);
    push(&h->undo, species_copy(before));
}

static bool step(struct stack *from, struct stack *to, struct species **s)
{
    if (from->n == 0)
        return false;
    push(to, *s);
    *s = from->states[--from->n];
    return true;
}

bool history_undo(struct history *h, struct species **s) { return step(&h->undo, &h->redo, s); }

bool history_redo(struct history *h, struct species **s) { return step(&h->redo, &h->undo, s); }
