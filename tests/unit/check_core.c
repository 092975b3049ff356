#include "config.h"

#include "base/count.h"
#include "base/text.h"
#include "core/element.h"
#include "core/species.h"

#include <check.h>
#include <stdlib.h>

START_TEST(count_outgrows_a_word)
{
    struct count c, two;
    char *s;
    int i;

    count_init(&c, 1);
    count_init(&two, 2);
    for (i = 0; i < 100; i++)
        count_mul(&c, &two);
    s = count_text(&c);
    /* 2^100, a standard value. */
    ck_assert_str_eq(s, "1267650600228229401496703205376");
    free(s);
    count_done(&c);
}
END_TEST

START_TEST(formula_follows_hill)
{
    struct species *s = species_new();
    char *f;
    int c = species_add_atom(s, 6), o = species_add_atom(s, 8), h = species_add_atom(s, 1);

    ck_assert_int_eq(species_add_bond(s, c, o, 1), 0);
    ck_assert_int_eq(species_add_bond(s, o, h, 1), 1);
    ck_assert_int_eq(species_add_bond(s, h, o, 1), -1);
    ck_assert_int_eq(species_add_bond(s, h, h, 1), -1);
    f = species_formula(s);
    ck_assert_str_eq(f, "CHO");
    free(f);
    ck_assert_int_eq(s->multiplicity, 2);
    species_set_charge(s, -1);
    ck_assert_int_eq(s->multiplicity, 1);
    ck_assert_ptr_null(species_check(s));
    species_remove_atom(s, o);
    ck_assert_int_eq(s->n_bonds, 0);
    species_free(s);
}
END_TEST

START_TEST(unsafe_text_is_neutralised)
{
    struct text t;

    text_init(&t);
    text_add_safe(&t, "a\033[2Jb\xc2\x9b\xff\xe2\x80\xae", 0);
    ck_assert_str_eq(t.s, "a?[2Jb???");
    text_done(&t);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("core");
    TCase *t = tcase_create("core");
    SRunner *r;
    int failed;

    tcase_add_test(t, count_outgrows_a_word);
    tcase_add_test(t, formula_follows_hill);
    tcase_add_test(t, unsafe_text_is_neutralised);
    suite_add_tcase(suite, t);
    r = srunner_create(suite);
    srunner_run_all(r, CK_ENV);
    failed = srunner_ntests_failed(r);
    srunner_free(r);
    return failed ? EXIT_FAILURE : EXIT_SUCCESS;
}
