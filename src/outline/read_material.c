/* SPDX-License-Identifier: GPL-3.0-or-later
 * "materials": names with their constants. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "outline/read.h"

enum { KEY_E = 1, KEY_NU = 2 };

static const utw_key material_key[] = {
    {"E", utw_read_number, offsetof(utw_material, E)},
    {"nu", utw_read_number, offsetof(utw_material, nu)},
    {"density", utw_read_number, offsetof(utw_material, density)},
    {"yield", utw_read_number, offsetof(utw_material, yield)},
};

static utw_status check_material(utw_reader *r, const utw_material *m, unsigned given)
{
    if (!(given & KEY_E))
        return utw_fail(r->err, UTW_E_MATERIAL, "\"E\" is missing; give the modulus of elasticity");
    if (!(given & KEY_NU))
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "\"nu\" is missing; give Poisson's ratio, such as 0.3");
    if (!(m->E > 0))
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "\"E\" is %g; the modulus of elasticity must be greater than 0", m->E);
    if (!(m->nu > -1 && m->nu <= 0.5))
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "\"nu\" is %g; Poisson's ratio must be greater than -1 and at most 0.5",
                        m->nu);
    if (m->density <= 0)
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "\"density\" is %g; it must be greater than 0, or left out", m->density);
    if (m->yield <= 0)
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "\"yield\" is %g; it must be greater than 0, or left out", m->yield);
    return UTW_OK;
}

static int find(const utw_outline *outline, const char *name)
{
    for (int i = 0; i < outline->n_material; i++)
        if (strcmp(outline->material[i].name, name) == 0) return i;
    return -1;
}

static utw_status read_material(utw_reader *r, const utw_json *value, utw_outline *outline)
{
    const char *name = utw_json_key(value);
    unsigned given = 0;
    snprintf(r->subject, sizeof r->subject, "material \"%.60s\"", name);
    if (name[0] == '\0') return utw_fail(r->err, UTW_E_MATERIAL, "a material needs a name");
    if (strlen(name) > UTW_LONGEST_NAME)
        return utw_fail(r->err, UTW_E_MATERIAL, "the name is longer than %d bytes",
                        UTW_LONGEST_NAME);
    for (const char *c = name; *c != '\0'; c++)
        if ((unsigned char)*c < 0x20 || *c == 0x7F)
            return utw_fail(r->err, UTW_E_MATERIAL,
                            "the name holds a line break or another control character; remove it");
    if (find(outline, name) >= 0)
        return utw_fail(r->err, UTW_E_MATERIAL, "is defined twice; remove or rename one");
    utw_material m = {.E = NAN, .nu = NAN, .density = NAN, .yield = NAN};
    utw_status st = utw_read_object(r, value, "the material", material_key, 4, &m, &given);
    if (st == UTW_OK) st = check_material(r, &m, given);
    if (st != UTW_OK) return st;
    m.name = utw_copy_string(name);
    if (m.name == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (material)");
    outline->material[outline->n_material++] = m;
    r->subject[0] = '\0';
    return UTW_OK;
}

utw_status utw_read_materials(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    if (utw_json_kind_of(value) != UTW_JSON_OBJECT)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s must be an object {\"name\": {\"E\": ..., \"nu\": ...}}, not %s", what,
                        utw_json_kind_text(value));
    const int n = utw_json_count(value);
    if (n > UTW_MOST_MATERIALS)
        return utw_fail(r->err, UTW_E_MATERIAL, "%s has %d members; at most %d are read", what, n,
                        UTW_MOST_MATERIALS);
    outline->material = utw_alloc((size_t)n, sizeof *outline->material);
    if (outline->material == NULL)
        return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d materials)", n);
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        const utw_status st = read_material(r, m, outline);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

utw_status utw_read_material_name(utw_reader *r, const utw_json *value, const char *what,
                                  void *target)
{
    int *material = target;
    if (utw_json_kind_of(value) != UTW_JSON_STRING)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s must be the name of a material in double quotes, not %s", what,
                        utw_json_kind_text(value));
    *material = find(r->outline, utw_json_string(value));
    if (*material < 0)
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "the material \"%.60s\" is not defined; add it to \"materials\"",
                        utw_json_string(value));
    return UTW_OK;
}
