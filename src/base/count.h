/* Exact counts of any size. Small ones stay in a machine word; the few that
 * outgrow it are carried by GMP, whose only user in the program is count.c. */
#ifndef DW_BASE_COUNT_H
#define DW_BASE_COUNT_H

#include <stdbool.h>
#include <stdint.h>

struct count {
    uint64_t small; /* the value, while big is NULL */
    void *big;      /* an mpz_t on the heap, owned */
};

void count_init(struct count *c, uint64_t value); /* storage is the caller's */
void count_done(struct count *c);
void count_copy(struct count *to, const struct count *from);                       /* both initialised */
void count_add(struct count *to, const struct count *by);                          /* to += by */
void count_mul(struct count *to, const struct count *by);                          /* to *= by */
void count_add_product(struct count *to, const struct count *a, const struct count *b, unsigned times); /* to += a b times */
bool count_is_zero(const struct count *c);
int count_compare(const struct count *a, const struct count *b);                   /* <0, 0, >0 */
bool count_fits(const struct count *c, uint64_t *value);                           /* false above 2^64 - 1 */
double count_ratio(const struct count *a, const struct count *b);                  /* a / b, b not zero; correctly near, whatever the size */
char *count_text(const struct count *c);                                           /* decimal digits; the caller frees */

#endif
