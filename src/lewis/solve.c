#include "config.h"

#include "lewis/solve.h"

#include "base/alloc.h"
#include "lewis/order.h"

#include <assert.h>
#include <stdlib.h>
#include <string.h>

/* More choices than this in one species and the search is given up. */
enum { EDGES_MAX = 6000000, NO_BUDGET = 1 << 20 };

/* Four bits an open atom: pi pairs received (3), and whether one of the givers
 * is expanded by pi (1). Beside them the charge and the odd electrons so far. */
struct key {
    uint64_t open;
    int charge;
    int odd;
};

struct state {
    struct key key;
    uint64_t cost;
    struct count ways;  /* to reach it at that cost */
    struct count rest;  /* to go on from it to the end at least cost */
};

struct edge {
    int from, to;
    uint64_t cost;      /* at the far end */
    unsigned pi;        /* two bits for each later neighbour */
    short option;
};

struct layer {
    struct state *states;
    int n, room;
    struct edge *edges; /* that lead into this layer */
    int n_edges, edges_room;
};

struct budget {
    int missing, charge, excess;
};

struct solution {
    const struct problem *p;
    struct step *steps;
    struct layer *layers; /* [n_atoms + 1] */
    int end;              /* index of the final state */
};

/* --- one layer ------------------------------------------------------------ */

struct index {
    int *slots; /* state number + 1, 0 = free */
    size_t size;
};

static size_t hash(const struct key *k)
{
    uint64_t h = k->open * UINT64_C(0x9e3779b97f4a7c15);

    h ^= (uint64_t)(k->charge + 4096) * UINT64_C(0xc2b2ae3d27d4eb4f) ^ (uint64_t)k->odd * UINT64_C(0x165667b19e3779f9);
    h ^= h >> 29;
    h *= UINT64_C(0xbf58476d1ce4e5b9);
    return (size_t)(h ^ h >> 32);
}

static bool same_key(const struct key *a, const struct key *b)
{
    return a->open == b->open && a->charge == b->charge && a->odd == b->odd;
}

static void index_grow(struct index *ix, const struct layer *l)
{
    int i;

    alloc_free(ix->slots);
    ix->size = ix->size ? ix->size * 4 : 16;
    ix->slots = NEW_ARRAY(int, ix->size);
    for (i = 0; i < l->n; i++) {
        size_t at = hash(&l->states[i].key) & (ix->size - 1);

        while (ix->slots[at])
            at = (at + 1) & (ix->size - 1);
        ix->slots[at] = i + 1;
    }
}

/* The state with that key, made where it is new (with the highest cost). */
static int layer_state(struct layer *l, struct index *ix, const struct key *key)
{
    size_t at;

    if ((size_t)l->n * 2 + 2 > ix->size)
        index_grow(ix, l);
    at = hash(key) & (ix->size - 1);
    while (ix->slots[at]) {
        if (same_key(&l->states[ix->slots[at] - 1].key, key))
            return ix->slots[at] - 1;
        at = (at + 1) & (ix->size - 1);
    }
    if (l->n == l->room) {
        l->room = l->room ? 2 * l->room : 8;
        l->states = alloc_resize(l->states, (size_t)l->room, sizeof *l->states);
    }
    memset(&l->states[l->n], 0, sizeof *l->states);
    l->states[l->n].key = *key;
    l->states[l->n].cost = UINT64_MAX;
    ix->slots[at] = l->n + 1;
    return l->n++;
}

static void layer_edge(struct layer *l, const struct edge *e)
{
    if (l->n_edges == l->edges_room) {
        l->edges_room = l->edges_room ? 2 * l->edges_room : 16;
        l->edges = alloc_resize(l->edges, (size_t)l->edges_room, sizeof *l->edges);
    }
    l->edges[l->n_edges++] = *e;
}

/* --- forward -------------------------------------------------------------- */

struct pass {
    const struct problem *p;
    const struct step *step;
    const struct budget *budget;
    const struct layer *from;
    struct layer *to;
    struct index index;
    bool too_wide;
};

static bool within(const struct pass *w, uint64_t cost, int charge)
{
    const struct problem *p = w->p;

    return problem_cost_of(p, cost, COST_MISSING) <= w->budget->missing &&
           problem_cost_of(p, cost, COST_CHARGE) + abs(p->charge - charge) <= w->budget->charge &&
           problem_cost_of(p, cost, COST_EXCESS) <= w->budget->excess;
}

/* All atom numbers for one choice of pi towards the later neighbours. */
static void extend(struct pass *w, int from, int pi_sum, unsigned pi, uint64_t open, bool giver_expanded)
{
    const struct site *site = &w->p->sites[w->step->atom];
    const struct state *s = &w->from->states[from];
    int o, k;

    for (o = site->first[pi_sum]; o < site->first[pi_sum + 1]; o++) {
        const struct site_option *option = &site->options[o];
        struct key key = {open, s->key.charge + option->charge, s->key.odd + option->odd};
        uint64_t cost = s->cost + option->cost;
        struct edge e;

        if (key.odd > w->p->odd || !within(w, cost, key.charge))
            continue;
        if (option->expanded && giver_expanded && !w->p->relaxed)
            continue;
        if (option->expanded)
            for (k = 0; k < w->step->n_later; k++)
                if (pi >> 2 * k & 3)
                    key.open |= UINT64_C(8) << 4 * w->step->later_slot[k];
        e.from = from;
        e.to = layer_state(w->to, &w->index, &key);
        e.cost = cost;
        e.pi = pi;
        e.option = (short)o;
        if (cost > w->to->states[e.to].cost)
            continue;
        if (w->to->n_edges >= EDGES_MAX) {
            w->too_wide = true;
            return;
        }
        w->to->states[e.to].cost = cost;
        layer_edge(w->to, &e);
    }
}

/* Every choice of pi towards the later neighbours, from the k-th on. */
static void spread(struct pass *w, int from, int k, int pi_sum, unsigned pi, uint64_t open, bool giver_expanded)
{
    const struct problem *p = w->p;
    const struct step *step = w->step;
    int n, bond, most;

    if (k == step->n_later) {
        extend(w, from, pi_sum, pi, open, giver_expanded);
        return;
    }
    bond = step->later_bond[k];
    most = p->pi_high[bond];
    for (n = p->pi_low[bond]; n <= most && pi_sum + n <= p->sites[step->atom].pi_max; n++) {
        int other = p->species->bonds[bond].a == step->atom ? p->species->bonds[bond].b : p->species->bonds[bond].a;
        int received = (int)(open >> 4 * step->later_slot[k] & 7) + n;

        if (received > p->sites[other].pi_max)
            break;
        spread(w, from, k + 1, pi_sum + n, pi | (unsigned)n << 2 * k,
               open + ((uint64_t)n << 4 * step->later_slot[k]), giver_expanded);
    }
}

static void forward(struct pass *w)
{
    int i, pass_size = w->from->n;

    for (i = 0; i < pass_size && !w->too_wide; i++) {
        uint64_t open = w->from->states[i].key.open;
        int received = 0;
        bool giver_expanded = false;

        if (w->step->slot >= 0) {
            unsigned mine = (unsigned)(open >> 4 * w->step->slot & 15);

            received = (int)(mine & 7);
            giver_expanded = mine >> 3;
            open &= ~(UINT64_C(15) << 4 * w->step->slot);
        }
        if (received <= w->p->sites[w->step->atom].pi_max)
            spread(w, i, 0, received, 0, open, giver_expanded);
    }
}

/* --- counting ------------------------------------------------------------- */

static void layer_done(struct layer *l)
{
    int i;

    for (i = 0; i < l->n; i++) {
        count_done(&l->states[i].ways);
        count_done(&l->states[i].rest);
    }
    alloc_free(l->states);
    alloc_free(l->edges);
    memset(l, 0, sizeof *l);
}

/* Drops the edges that are not of least cost for their far end, and adds up. */
static void count_forward(struct solution *s)
{
    int i, j, kept;

    for (i = 1; i <= s->p->n_atoms; i++) {
        struct layer *l = &s->layers[i];

        for (j = kept = 0; j < l->n_edges; j++) {
            struct edge e = l->edges[j];

            if (e.cost != l->states[e.to].cost)
                continue;
            count_add(&l->states[e.to].ways, &s->layers[i - 1].states[e.from].ways);
            l->edges[kept++] = e;
        }
        l->n_edges = kept;
    }
}

static void count_backward(struct solution *s)
{
    int i, j;

    count_init(&s->layers[s->p->n_atoms].states[s->end].rest, 1);
    for (i = s->p->n_atoms; i > 0; i--) {
        struct layer *l = &s->layers[i];

        for (j = 0; j < l->n_edges; j++) {
            const struct edge *e = &l->edges[j];

            if (!count_is_zero(&l->states[e->to].rest))
                count_add(&s->layers[i - 1].states[e->from].rest, &l->states[e->to].rest);
        }
    }
}

static int find_end(const struct solution *s)
{
    const struct layer *l = &s->layers[s->p->n_atoms];
    int i;

    for (i = 0; i < l->n; i++)
        if (l->states[i].key.charge == s->p->charge && l->states[i].key.odd == s->p->odd)
            return i;
    return -1;
}

void solution_free(struct solution *s)
{
    int i;

    if (!s)
        return;
    for (i = 0; s->layers && i <= s->p->n_atoms; i++)
        layer_done(&s->layers[i]);
    alloc_free(s->layers);
    alloc_free(s->steps);
    alloc_free(s);
}

/* One pass under a budget. */
static enum solve_status try_budget(struct solution *s, const struct budget *budget)
{
    const struct problem *p = s->p;
    struct key start = {0, 0, 0};
    struct index ix = {NULL, 0};
    long edges = 0;
    int i;

    for (i = 0; i <= p->n_atoms; i++)
        layer_done(&s->layers[i]);
    layer_state(&s->layers[0], &ix, &start);
    alloc_free(ix.slots);
    s->layers[0].states[0].cost = 0;
    count_init(&s->layers[0].states[0].ways, 1);
    for (i = 0; i < p->n_atoms; i++) {
        struct pass w = {p, &s->steps[i], budget, &s->layers[i], &s->layers[i + 1], {NULL, 0}, false};

        forward(&w);
        alloc_free(w.index.slots);
        edges += s->layers[i + 1].n_edges;
        if (w.too_wide || edges > EDGES_MAX)
            return SOLVE_TOO_WIDE;
        if (s->layers[i + 1].n == 0)
            return SOLVE_NONE;
    }
    s->end = find_end(s);
    return s->end < 0 ? SOLVE_NONE : SOLVE_FOUND;
}

/* --- budgets -------------------------------------------------------------- */

/* The least number of missing electrons that no arrangement goes below. */
static int least_missing(const struct problem *p)
{
    int i;

    if (p->odd_free)
        return 0;
    for (i = 0; i < p->n_atoms; i++)
        if (p->sites[i].may_expand || p->sites[i].may_be_short || p->relaxed)
            return 0;
    return p->odd;
}

static int least_excess(const struct problem *p)
{
    int i, sum = 0;

    for (i = 0; i < p->n_atoms; i++)
        sum += p->sites[i].may_expand && 2 * p->sites[i].sigma > 8 ? 2 * p->sites[i].sigma - 8 : 0;
    return sum;
}

/* Least missing first, then least charge: the charge budget grows quickly while
 * nothing may be missing, and is given up before more may be missing. */
static enum solve_status search_charge(struct solution *s, int excess)
{
    const struct problem *p = s->p;
    int least = least_missing(p), missing, step;
    struct budget b = {least, 0, excess};
    enum solve_status status = SOLVE_NONE;

    for (step = 0; step <= 8; step = step ? 2 * step : 2) {
        b.charge = abs(p->charge) + step;
        status = try_budget(s, &b);
        if (status != SOLVE_NONE)
            break;
    }
    if (status == SOLVE_FOUND)
        return status;
    for (missing = least; status == SOLVE_NONE && missing < NO_BUDGET; missing = missing ? 2 * missing : 2) {
        b.missing = missing > 4096 ? NO_BUDGET : missing;
        b.charge = NO_BUDGET;
        status = try_budget(s, &b);
        if (b.missing == NO_BUDGET)
            break;
    }
    return status;
}

enum solve_status problem_solve(const struct problem *p, struct solution **solution)
{
    struct solution *s = NEW(struct solution);
    enum solve_status status = SOLVE_TOO_WIDE;

    s->p = p;
    s->steps = NEW_ARRAY(struct step, p->n_atoms);
    s->layers = NEW_ARRAY(struct layer, p->n_atoms + 1);
    *solution = NULL;
    if (order_make(p, s->steps)) {
        int excess = p->octet && !p->relaxed ? least_excess(p) : NO_BUDGET;

        /* Under the octet preference the least expansion that works comes first. */
        do {
            status = search_charge(s, excess);
            excess = excess > 64 ? NO_BUDGET : excess < 8 ? excess + 1 : 2 * excess;
        } while (status == SOLVE_NONE && excess < NO_BUDGET);
    }
    if (status == SOLVE_FOUND) {
        count_forward(s);
        count_backward(s);
        *solution = s;
    } else {
        solution_free(s);
    }
    return status;
}

/* --- asking the solution -------------------------------------------------- */

uint64_t solution_cost(const struct solution *s) { return s->layers[s->p->n_atoms].states[s->end].cost; }

const struct count *solution_count(const struct solution *s) { return &s->layers[s->p->n_atoms].states[s->end].ways; }

static void add_share(double *sum, int times, double share)
{
    if (sum && times)
        *sum += times * share;
}

void solution_means(const struct solution *s, double *pi, double *lone_pairs, double *odd)
{
    const struct problem *p = s->p;
    int i, j, k;

    if (pi)
        memset(pi, 0, (size_t)p->n_bonds * sizeof *pi);
    if (lone_pairs)
        memset(lone_pairs, 0, (size_t)p->n_atoms * sizeof *lone_pairs);
    if (odd)
        memset(odd, 0, (size_t)p->n_atoms * sizeof *odd);
    for (i = 1; i <= p->n_atoms; i++) {
        const struct step *step = &s->steps[i - 1];
        const struct layer *l = &s->layers[i];

        for (j = 0; j < l->n_edges; j++) {
            const struct edge *e = &l->edges[j];
            const struct site_option *o = &p->sites[step->atom].options[e->option];
            struct count part;
            double share;

            if (count_is_zero(&l->states[e->to].rest))
                continue;
            count_init(&part, 0);
            count_add_product(&part, &s->layers[i - 1].states[e->from].ways, &l->states[e->to].rest, 1);
            share = count_ratio(&part, solution_count(s));
            count_done(&part);
            add_share(lone_pairs ? &lone_pairs[step->atom] : NULL, o->lone_pairs, share);
            add_share(odd ? &odd[step->atom] : NULL, o->odd, share);
            for (k = 0; k < step->n_later; k++)
                add_share(pi ? &pi[step->later_bond[k]] : NULL, (int)(e->pi >> 2 * k & 3), share);
        }
    }
}

struct walk {
    const struct solution *s;
    int **first;   /* edges by their far state: a list for each layer */
    int **next;
    struct arrangement at;
    long left, made;
    void (*visit)(const struct arrangement *, void *);
    void *data;
};

static void walk_back(struct walk *w, int layer, int state)
{
    const struct solution *s = w->s;
    const struct step *step;
    int j, k;

    if (w->left == 0)
        return;
    if (layer == 0) {
        w->visit(&w->at, w->data);
        w->left--;
        w->made++;
        return;
    }
    step = &s->steps[layer - 1];
    for (j = w->first[layer][state]; j >= 0; j = w->next[layer][j]) {
        const struct edge *e = &s->layers[layer].edges[j];
        const struct site_option *o = &s->p->sites[step->atom].options[e->option];

        w->at.lone_pairs[step->atom] = o->lone_pairs;
        w->at.odd[step->atom] = o->odd;
        for (k = 0; k < step->n_later; k++)
            w->at.pi[step->later_bond[k]] = (signed char)(e->pi >> 2 * k & 3);
        walk_back(w, layer - 1, e->from);
    }
}

static void walk_index(struct walk *w)
{
    const struct solution *s = w->s;
    int i, j;

    w->first = NEW_ARRAY(int *, s->p->n_atoms + 1);
    w->next = NEW_ARRAY(int *, s->p->n_atoms + 1);
    for (i = 1; i <= s->p->n_atoms; i++) {
        const struct layer *l = &s->layers[i];

        w->first[i] = NEW_ARRAY(int, l->n);
        w->next[i] = NEW_ARRAY(int, l->n_edges);
        for (j = 0; j < l->n; j++)
            w->first[i][j] = -1;
        for (j = l->n_edges - 1; j >= 0; j--) {
            w->next[i][j] = w->first[i][l->edges[j].to];
            w->first[i][l->edges[j].to] = j;
        }
    }
}

long solution_visit(const struct solution *s, long max, void (*visit)(const struct arrangement *, void *), void *data)
{
    struct walk w = {.s = s, .left = max, .visit = visit, .data = data};
    int i;

    w.at.pi = NEW_ARRAY(signed char, s->p->n_bonds);
    w.at.lone_pairs = NEW_ARRAY(signed char, s->p->n_atoms);
    w.at.odd = NEW_ARRAY(signed char, s->p->n_atoms);
    walk_index(&w);
    walk_back(&w, s->p->n_atoms, s->end);
    for (i = 1; i <= s->p->n_atoms; i++) {
        alloc_free(w.first[i]);
        alloc_free(w.next[i]);
    }
    alloc_free(w.first);
    alloc_free(w.next);
    alloc_free(w.at.pi);
    alloc_free(w.at.lone_pairs);
    alloc_free(w.at.odd);
    return w.made;
}
