#include "config.h"

#include "base/count.h"

#include "base/alloc.h"

#include <gmp.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

static mpz_t *big_of(const struct count *c) { return c->big; }

static void grow(struct count *c)
{
    mpz_t *z;

    if (c->big)
        return;
    z = alloc_new(1, sizeof *z);
    mpz_init(*z);
    mpz_import(*z, 1, -1, sizeof c->small, 0, 0, &c->small);
    c->big = z;
}

void count_init(struct count *c, uint64_t value)
{
    c->small = value;
    c->big = NULL;
}

void count_done(struct count *c)
{
    if (c->big) {
        mpz_clear(*big_of(c));
        alloc_free(c->big);
    }
    count_init(c, 0);
}

void count_copy(struct count *to, const struct count *from)
{
    if (to == from)
        return;
    count_done(to);
    to->small = from->small;
    if (from->big) {
        mpz_t *z = alloc_new(1, sizeof *z);

        mpz_init_set(*z, *big_of(from));
        to->big = z;
    }
}

void count_add(struct count *to, const struct count *by)
{
    if (!to->big && !by->big) {
        uint64_t sum;

        if (!__builtin_add_overflow(to->small, by->small, &sum)) {
            to->small = sum;
            return;
        }
    }
    grow(to);
    if (by->big) {
        mpz_add(*big_of(to), *big_of(to), *big_of(by));
    } else {
        struct count wide = {by->small, NULL};

        grow(&wide);
        mpz_add(*big_of(to), *big_of(to), *big_of(&wide));
        count_done(&wide);
    }
}

void count_mul(struct count *to, const struct count *by)
{
    if (!to->big && !by->big) {
        uint64_t product;

        if (!__builtin_mul_overflow(to->small, by->small, &product)) {
            to->small = product;
            return;
        }
    }
    grow(to);
    if (by->big) {
        mpz_mul(*big_of(to), *big_of(to), *big_of(by));
    } else {
        struct count wide = {by->small, NULL};

        grow(&wide);
        mpz_mul(*big_of(to), *big_of(to), *big_of(&wide));
        count_done(&wide);
    }
}

void count_add_product(struct count *to, const struct count *a, const struct count *b, unsigned times)
{
    struct count product, factor;

    if (times == 0)
        return;
    count_init(&product, 0);
    count_init(&factor, times);
    count_copy(&product, a);
    count_mul(&product, b);
    count_mul(&product, &factor);
    count_add(to, &product);
    count_done(&product);
    count_done(&factor);
}

bool count_is_zero(const struct count *c) { return c->big ? mpz_sgn(*big_of(c)) == 0 : c->small == 0; }

int count_compare(const struct count *a, const struct count *b)
{
    struct count x, y;
    int order;

    if (!a->big && !b->big)
        return (a->small > b->small) - (a->small < b->small);
    count_init(&x, 0);
    count_init(&y, 0);
    count_copy(&x, a);
    count_copy(&y, b);
    grow(&x);
    grow(&y);
    order = mpz_cmp(*big_of(&x), *big_of(&y));
    count_done(&x);
    count_done(&y);
    return order;
}

bool count_fits(const struct count *c, uint64_t *value)
{
    if (c->big) {
        if (mpz_sizeinbase(*big_of(c), 2) > 64)
            return false;
        *value = 0;
        mpz_export(value, NULL, -1, sizeof *value, 0, 0, *big_of(c));
        return true;
    }
    *value = c->small;
    return true;
}

double count_ratio(const struct count *a, const struct count *b)
{
    struct count x, y;
    mpq_t q;
    double ratio;

    if (!a->big && !b->big && a->small < (UINT64_C(1) << 53) && b->small < (UINT64_C(1) << 53))
        return (double)a->small / (double)b->small;
    count_init(&x, 0);
    count_init(&y, 0);
    count_copy(&x, a);
    count_copy(&y, b);
    grow(&x);
    grow(&y);
    mpq_init(q);
    mpq_set_num(q, *big_of(&x));
    mpq_set_den(q, *big_of(&y));
    mpq_canonicalize(q);
    ratio = mpq_get_d(q);
    mpq_clear(q);
    count_done(&x);
    count_done(&y);
    return ratio;
}

char *count_text(const struct count *c)
{
    char digits[24];

    if (c->big) {
        char *s = alloc_new(mpz_sizeinbase(*big_of(c), 10) + 2, 1);

        return mpz_get_str(s, 10, *big_of(c));
    }
    snprintf(digits, sizeof digits, "%llu", (unsigned long long)c->small);
    return alloc_text(digits);
}
