/* The Lewis engine: which electron arrangements a species has, which of them
 * contribute, what is wrong with what was drawn, and how to mend it.
 *
 * Words used here. A form fixes the order of every bond and the lone pairs and
 * odd electrons of every atom. Shell = electrons in bonds (two each) plus its
 * own. The contributing forms are those that tie under the rules below.
 *
 * Rules (PREFER_LOW_CHARGE): fewest electrons missing from shells in total
 * (eight, two for H and He; groups 1, 2, 13 may be short without counting);
 * then the smallest sum of |formal charge|; then the least expansion. A
 * period-3 or heavier atom passes eight by pi bonds only where its formal
 * charge does not become negative by it, never as a terminal atom, and never
 * towards another atom that does the same; a terminal halogen takes no pi bond.
 * PREFER_OCTET: least expansion comes first, and the rest as above.
 * An odd electron sits on an atom with two or more neighbours that is less
 * electronegative than they are (hydrogen aside) where every other shell is
 * then complete; where there is none, the rules above decide. */
#ifndef DW_LEWIS_LEWIS_H
#define DW_LEWIS_LEWIS_H

#include "base/count.h"
#include "core/species.h"

#include <stdbool.h>

enum preference { PREFER_LOW_CHARGE, PREFER_OCTET };
enum verdict { VERDICT_SOUND, VERDICT_FLAWED, VERDICT_BEYOND };
enum severity { SEVERITY_NOTE, SEVERITY_WARNING, SEVERITY_ERROR };

struct lewis_options {
    enum preference prefer;
    bool as_drawn;     /* judge the drawn orders; do not look for a better form */
    int list_max;      /* list at most this many contributing forms (0: one) */
    bool no_mends;     /* leave the search for mends out */
};

struct form {
    signed char *order;         /* [n_bonds] 1..3 */
    signed char *lone_pairs;    /* [n_atoms] */
    signed char *unpaired;      /* [n_atoms] */
    signed char *formal_charge; /* [n_atoms] */
    double score;               /* ranking score: lower is better; a heuristic, not a weight */
    int cls;                    /* number of its class under the automorphisms, -1 unknown */
    int alike;                  /* on the first form of a class: forms in it, else 0 */
};

struct finding {
    const char *code;           /* stable, e.g. "short-shell" */
    enum severity severity;
    int *atoms;
    int n_atoms;
    char *text;                 /* one plain sentence */
};

/* A concrete edit that leads to a sound form; lists hold what changes. */
struct mend {
    char *text;
    int charge, multiplicity;       /* after the edit */
    int (*bonds)[3];                /* atom, atom, order as it then stands; order 0 = the bond goes */
    int n_bonds;
    int (*lone_pairs)[2];           /* atom, lone pairs as they then stand */
    int n_lone_pairs;
    int size;                       /* how many single steps the edit is */
};

struct lewis {
    int n_atoms, n_bonds;
    int available;                  /* valence electrons for the charge; may be negative */
    int placed;                     /* in the shown form */
    int unpaired;                   /* in the shown form */
    enum verdict verdict;
    struct finding *findings;
    int n_findings;
    struct mend *mends;
    int n_mends;
    bool has_form;                  /* false: no arrangement exists; arrays below are then of skeleton values */
    struct form shown;              /* the best form, or the drawn one (as_drawn) */
    int *shell;                     /* [n_atoms] of the shown form */
    struct count count;             /* contributing forms */
    bool exact;
    int classes;                    /* -1: not computed, too many forms */
    double *mean_order;             /* [n_bonds] over the contributing forms, equal weights */
    double *mean_lone_pairs;        /* [n_atoms] */
    double *mean_unpaired;          /* [n_atoms] */
    double *mean_charge;            /* [n_atoms] mean formal charge */
    struct form *forms;             /* listed, best score first */
    int n_forms;
    bool all_listed;
};

/* Never fails: what cannot be judged has a finding. The caller frees with lewis_free. */
struct lewis *lewis_solve(const struct species *s, const struct lewis_options *options);
void lewis_free(struct lewis *l);

/* Adds the hydrogens that make valences up to the usual ones for the drawn orders
 * (B 3; C 4; N 3; O 2; P 3; S 2; halogens 1, likewise their heavier congeners), as
 * real atoms without a place on the grid; gives their number. */
int lewis_fill_hydrogens(struct species *s);

const char *lewis_verdict_word(enum verdict v);    /* "sound" "flawed" "beyond" */
const char *lewis_severity_word(enum severity s);  /* "note" "warning" "error" */

#endif
