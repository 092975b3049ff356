#include "config.h"

#include "lewis/lewis.h"

#include "base/alloc.h"
#include "core/element.h"
#include "lewis/internal.h"
#include "lewis/rank.h"

#include <stdlib.h>
#include <string.h>

/* More forms than this are counted but neither listed in full nor classed. */
enum { LIST_MAX = 4000, CLASS_MAX = 600 };

const char *lewis_verdict_word(enum verdict v)
{
    static const char *const words[] = {"sound", "flawed", "beyond"};

    return words[v];
}

const char *lewis_severity_word(enum severity s)
{
    static const char *const words[] = {"note", "warning", "error"};

    return words[s];
}

void form_init(struct form *f, const struct species *s)
{
    memset(f, 0, sizeof *f);
    f->order = NEW_ARRAY(signed char, s->n_bonds);
    f->lone_pairs = NEW_ARRAY(signed char, s->n_atoms);
    f->unpaired = NEW_ARRAY(signed char, s->n_atoms);
    f->formal_charge = NEW_ARRAY(signed char, s->n_atoms);
    f->cls = -1;
}

void form_done(struct form *f)
{
    alloc_free(f->order);
    alloc_free(f->lone_pairs);
    alloc_free(f->unpaired);
    alloc_free(f->formal_charge);
    memset(f, 0, sizeof *f);
}

void form_copy(struct form *to, const struct form *from, const struct species *s)
{
    form_init(to, s);
    memcpy(to->order, from->order, (size_t)s->n_bonds);
    memcpy(to->lone_pairs, from->lone_pairs, (size_t)s->n_atoms);
    memcpy(to->unpaired, from->unpaired, (size_t)s->n_atoms);
    memcpy(to->formal_charge, from->formal_charge, (size_t)s->n_atoms);
    to->score = from->score;
    to->cls = from->cls;
    to->alike = from->alike;
}

/* Formal charges from the rest of a form. */
static void set_charges(const struct species *s, struct form *f)
{
    int i;

    for (i = 0; i < s->n_atoms; i++) {
        int v = element_get(s->atoms[i].z)->valence;

        f->formal_charge[i] = (signed char)((v > 0 ? v : 0) - 2 * f->lone_pairs[i] - f->unpaired[i]);
    }
    for (i = 0; i < s->n_bonds; i++) {
        f->formal_charge[s->bonds[i].a] = (signed char)(f->formal_charge[s->bonds[i].a] - f->order[i]);
        f->formal_charge[s->bonds[i].b] = (signed char)(f->formal_charge[s->bonds[i].b] - f->order[i]);
    }
}

struct collector {
    const struct species *s;
    struct form *forms;
    int n;
};

static void collect(const struct arrangement *a, void *data)
{
    struct collector *c = data;
    struct form *f = &c->forms[c->n++];
    int i;

    form_init(f, c->s);
    for (i = 0; i < c->s->n_bonds; i++)
        f->order[i] = (signed char)(1 + a->pi[i]);
    memcpy(f->lone_pairs, a->lone_pairs, (size_t)c->s->n_atoms);
    memcpy(f->unpaired, a->odd, (size_t)c->s->n_atoms);
    set_charges(c->s, f);
    f->score = rank_score(c->s, f);
}

static void list_forms(struct lewis *l, const struct species *s, const struct solution *solution, int list_max)
{
    uint64_t total = 0;
    bool few = count_fits(solution_count(solution), &total) && total <= LIST_MAX;
    struct collector c = {s, NEW_ARRAY(struct form, few ? total : LIST_MAX), 0};
    int i, keep;

    solution_visit(solution, few ? (long)total : LIST_MAX, collect, &c);
    rank_sort(s, c.forms, c.n);
    l->classes = few && total <= CLASS_MAX ? c.n == 1 ? 1 : rank_classes(s, c.forms, c.n) : -1;
    if (l->classes == 1) {
        c.forms[0].cls = 0;
        c.forms[0].alike = c.n;
    }
    form_copy(&l->shown, &c.forms[0], s);
    keep = list_max < 1 ? 1 : list_max < c.n ? list_max : c.n;
    for (i = keep; i < c.n; i++)
        form_done(&c.forms[i]);
    l->forms = c.forms;
    l->n_forms = keep;
    l->all_listed = few && keep == c.n;
}

static void set_means(struct lewis *l, const struct species *s, const struct solution *solution)
{
    int i;

    solution_means(solution, l->mean_order, l->mean_lone_pairs, l->mean_unpaired);
    for (i = 0; i < s->n_atoms; i++) {
        int v = element_get(s->atoms[i].z)->valence;

        l->mean_charge[i] = (v > 0 ? v : 0) - 2 * l->mean_lone_pairs[i] - l->mean_unpaired[i];
    }
    for (i = 0; i < s->n_bonds; i++) {
        l->mean_order[i] += 1;
        l->mean_charge[s->bonds[i].a] -= l->mean_order[i];
        l->mean_charge[s->bonds[i].b] -= l->mean_order[i];
    }
    /* Sums of shares leave dust; a charge that small is none. */
    for (i = 0; i < s->n_atoms; i++)
        if (l->mean_charge[i] > -1e-9 && l->mean_charge[i] < 1e-9)
            l->mean_charge[i] = 0;
}

static void take_solution(struct lewis *l, struct judgement *j, const struct problem *p,
                          const struct solution *solution, int list_max)
{
    uint64_t cost = solution_cost(solution);

    l->has_form = true;
    l->exact = true;
    count_copy(&l->count, solution_count(solution));
    j->missing = problem_cost_of(p, cost, COST_MISSING);
    j->charge_sum = problem_cost_of(p, cost, COST_CHARGE);
    j->excess = problem_cost_of(p, cost, COST_EXCESS);
    set_means(l, p->species, solution);
    list_forms(l, p->species, solution, list_max);
}

/* The contributing forms by the rules. */
static enum solve_status solve_best(struct lewis *l, struct judgement *j, const struct species *s)
{
    struct problem p;
    struct solution *solution = NULL;
    bool *allowed = NULL;
    enum solve_status status = odd_solve(s, j->options->prefer == PREFER_OCTET, j->odd, &p, &solution, &allowed);

    if (status == SOLVE_FOUND)
        take_solution(l, j, &p, solution, j->options->list_max);
    solution_free(solution);
    problem_done(&p);
    alloc_free(allowed);
    return status;
}

/* The drawn orders with the best placement of what is left, shells broken where
 * it cannot be helped. */
static enum solve_status solve_drawn(struct lewis *l, struct judgement *j, const struct species *s)
{
    struct problem_setup setup = {.octet = j->options->prefer == PREFER_OCTET, .relaxed = true, .drawn = DRAWN_FIX,
                                  .odd = j->odd};
    struct problem p;
    struct solution *solution = NULL;
    enum solve_status status;

    problem_init(&p, s, &setup);
    status = problem_solve(&p, &solution);
    if (status == SOLVE_FOUND) {
        take_solution(l, j, &p, solution, j->options->list_max);
        j->relaxed = true;
    }
    solution_free(solution);
    problem_done(&p);
    return status;
}

/* How good the best form would be, for the comparison with a drawn one. */
static void compare_best(struct judgement *j, const struct species *s)
{
    struct problem p;
    struct solution *solution = NULL;
    bool *allowed = NULL;

    if (odd_solve(s, j->options->prefer == PREFER_OCTET, j->odd, &p, &solution, &allowed) == SOLVE_FOUND) {
        j->compared = true;
        j->best_missing = problem_cost_of(&p, solution_cost(solution), COST_MISSING);
        j->best_charge = problem_cost_of(&p, solution_cost(solution), COST_CHARGE);
    }
    solution_free(solution);
    problem_done(&p);
    alloc_free(allowed);
}

static void count_electrons(struct lewis *l, const struct species *s)
{
    int i;

    l->placed = 0;
    l->unpaired = 0;
    for (i = 0; i < s->n_atoms; i++) {
        l->shell[i] = 2 * l->shown.lone_pairs[i] + l->shown.unpaired[i];
        l->placed += l->shell[i];
        l->unpaired += l->shown.unpaired[i];
    }
    for (i = 0; i < s->n_bonds; i++) {
        l->placed += 2 * l->shown.order[i];
        l->shell[s->bonds[i].a] += 2 * l->shown.order[i];
        l->shell[s->bonds[i].b] += 2 * l->shown.order[i];
    }
}

/* No arrangement at all: show the skeleton as drawn, with no electrons but those of its bonds. */
static void show_skeleton(struct lewis *l, const struct species *s)
{
    int i;

    form_init(&l->shown, s);
    for (i = 0; i < s->n_bonds; i++) {
        l->shown.order[i] = (signed char)(s->bonds[i].order > 0 ? s->bonds[i].order : 1);
        l->mean_order[i] = l->shown.order[i];
    }
    set_charges(s, &l->shown);
    for (i = 0; i < s->n_atoms; i++)
        l->mean_charge[i] = l->shown.formal_charge[i];
    l->classes = -1;
}

struct lewis *lewis_solve(const struct species *s, const struct lewis_options *options)
{
    struct lewis *l = NEW(struct lewis);
    struct judgement j = {.species = s, .options = options};
    bool as_drawn = options->as_drawn || s->as_drawn;

    l->n_atoms = s->n_atoms;
    l->n_bonds = s->n_bonds;
    l->available = species_valence_electrons(s);
    l->shell = NEW_ARRAY(int, s->n_atoms);
    l->mean_order = NEW_ARRAY(double, s->n_bonds);
    l->mean_lone_pairs = NEW_ARRAY(double, s->n_atoms);
    l->mean_unpaired = NEW_ARRAY(double, s->n_atoms);
    l->mean_charge = NEW_ARRAY(double, s->n_atoms);
    count_init(&l->count, 0);

    j.odd = s->multiplicity - 1;
    j.parity_wrong = (abs(l->available) - j.odd) % 2 != 0;
    if (j.parity_wrong)
        j.odd = abs(l->available) % 2;
    if (s->n_atoms > 0) {
        enum solve_status status = as_drawn ? solve_drawn(l, &j, s) : solve_best(l, &j, s);

        if (as_drawn && status == SOLVE_FOUND)
            compare_best(&j, s);
        j.too_wide = status == SOLVE_TOO_WIDE;
        if (status != SOLVE_FOUND && !as_drawn)
            solve_drawn(l, &j, s);
        if (status != SOLVE_FOUND) {
            /* What is shown is no contributing form. */
            count_done(&l->count);
            l->exact = !j.too_wide;
            l->classes = l->exact ? 0 : -1;
        }
    }
    if (!l->has_form)
        show_skeleton(l, s);
    count_electrons(l, s);
    findings_judge(l, &j);
    if (l->verdict == VERDICT_FLAWED && !options->no_mends)
        mends_search(l, s, options);
    return l;
}

void lewis_free(struct lewis *l)
{
    int i;

    if (!l)
        return;
    for (i = 0; i < l->n_findings; i++) {
        alloc_free(l->findings[i].atoms);
        alloc_free(l->findings[i].text);
    }
    for (i = 0; i < l->n_mends; i++) {
        alloc_free(l->mends[i].text);
        alloc_free(l->mends[i].bonds);
        alloc_free(l->mends[i].lone_pairs);
    }
    for (i = 0; i < l->n_forms; i++)
        form_done(&l->forms[i]);
    form_done(&l->shown);
    count_done(&l->count);
    alloc_free(l->findings);
    alloc_free(l->mends);
    alloc_free(l->forms);
    alloc_free(l->shell);
    alloc_free(l->mean_order);
    alloc_free(l->mean_lone_pairs);
    alloc_free(l->mean_unpaired);
    alloc_free(l->mean_charge);
    alloc_free(l);
}
