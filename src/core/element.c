#include "config.h"

#include "core/element.h"

#include <string.h>

static const struct element table[ELEMENT_Z_MAX] = {
#include "core/element_table.inc"
};

const struct element *element_get(int z) { return z >= 1 && z <= ELEMENT_Z_MAX ? &table[z - 1] : NULL; }

int element_find(const char *symbol, size_t length)
{
    int z;

    if (length < 1 || length > 2)
        return 0;
    for (z = 1; z <= ELEMENT_Z_MAX; z++)
        if (strlen(table[z - 1].symbol) == length && memcmp(table[z - 1].symbol, symbol, length) == 0)
            return z;
    return 0;
}

bool element_is_halogen(int z)
{
    const struct element *e = element_get(z);

    return e && e->group == 17;
}

int element_shell_target(int z) { return z <= 2 ? 2 : 8; }

bool element_may_be_short(int z)
{
    const struct element *e = element_get(z);

    return e && z > 2 && (e->group == 1 || e->group == 2 || e->group == 13 || e->block == 'd' || e->block == 'f');
}

bool element_may_expand(int z)
{
    const struct element *e = element_get(z);

    return e && e->period >= 3 && (e->block == 'p' || e->block == 'd' || e->block == 'f');
}
