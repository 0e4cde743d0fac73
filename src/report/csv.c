/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes as comma-separated values (RFC 4180). */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/status.h"
#include "base/text.h"
#include "report/report.h"
#include "section/cases.h"

/* What the lines of one case and point have in common. */
typedef struct place {
    utw_text *text;
    const char *name, *point;
    double x, y;
} place;

/* A field in quotes when it holds what would end it. */
static void add_field(utw_text *text, const char *field)
{
    if (strpbrk(field, ",\"\r\n") == NULL) {
        utw_text_add(text, "%s", field);
        return;
    }
    utw_text_add(text, "\"");
    for (const char *c = field; *c != '\0'; c++)
        if (*c == '"')
            utw_text_add(text, "\"\"");
        else
            utw_text_add(text, "%c", *c);
    utw_text_add(text, "\"");
}

/* A number, or nothing when it does not exist. */
static void add_number(utw_text *text, double x)
{
    utw_text_add(text, ",");
    if (isfinite(x)) utw_text_add_number(text, x);
}

static void add_line(const place *p, const char *quantity, double value, double error,
                     const char *unit)
{
    add_field(p->text, p->name);
    utw_text_add(p->text, ",%s,%s", p->point, quantity);
    add_number(p->text, value);
    add_number(p->text, error);
    add_number(p->text, p->x);
    add_number(p->text, p->y);
    utw_text_add(p->text, ",%s\r\n", unit);
}

static void add_peaks(utw_text *text, const utw_case *c, const char *unit)
{
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) {
        const utw_stress_peak *peak = &c->peaks.peak[k];
        const place p = {text, c->name, "peak", peak->at[0], peak->at[1]};
        add_line(&p, utw_stress_kind_key((utw_stress_kind)k), peak->value, peak->error, unit);
    }
    const place p = {text, c->name, "peak", (double)NAN, (double)NAN};
    add_line(&p, "margin", c->peaks.margin, (double)NAN, "-");
    add_line(&p, "unbounded", c->peaks.unbounded, (double)NAN, "-");
}

static void add_probe(utw_text *text, const utw_case *c, int k, const char *unit,
                      const char *area_unit)
{
    char name[32];
    const utw_stress_point *q = &c->point[k];
    snprintf(name, sizeof name, "probe %d", k + 1);
    const place p = {text, c->name, name, q->at[0], q->at[1]};
    const double error = q->sigma_error + sqrt(3) * q->tau_error;
    add_line(&p, "sigma_z", q->sigma_z, q->sigma_error, unit);
    add_line(&p, "tau_xz", q->tau_xz, q->tau_error, unit);
    add_line(&p, "tau_yz", q->tau_yz, q->tau_error, unit);
    add_line(&p, "von_mises", q->von_mises, error, unit);
    add_line(&p, "principal_max", q->principal_max, q->sigma_error + q->tau_error, unit);
    add_line(&p, "principal_min", q->principal_min, q->sigma_error + q->tau_error, unit);
    add_line(&p, "omega", q->omega, (double)NAN, area_unit);
}

utw_status utw_report_csv(const utw_report *report, char **text, utw_error *err)
{
    const utw_status st = utw_report_check(report, text, __func__, err);
    if (st != UTW_OK) return st;
    if (report->cases == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_report_csv: the report has no load cases");
    const utw_cases *cases = report->cases;
    const utw_outline *o = report->solution->outline;
    char unit[24], area_unit[16];
    utw_text content = {.text = NULL};
    snprintf(unit, sizeof unit, "%s/%s^2", o->force_unit, o->length_unit);
    snprintf(area_unit, sizeof area_unit, "%s^2", o->length_unit);
    utw_text_add(&content, "case,point,quantity,value,error,x,y,unit\r\n");
    for (int i = 0; i < cases->n; i++) {
        if (cases->list[i].status != UTW_OK) continue;
        add_peaks(&content, &cases->list[i], unit);
        for (int k = 0; k < cases->n_probe; k++)
            add_probe(&content, &cases->list[i], k, unit, area_unit);
    }
    const utw_status taken = utw_text_take(&content, text, err);
    utw_text_clear(&content);
    return taken;
}
