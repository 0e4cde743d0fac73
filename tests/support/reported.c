/* SPDX-License-Identifier: GPL-3.0-or-later
 * A section with load cases and probes. */
#include "support/reported.h"

#include "base/memory.h"

#define ANGLE(material, use)                                                                       \
    "{\"units\": \"mm N\", " material "\"parts\": [{" use "\"outline\": [[0,0], [61,0], [61,7], "  \
    "[9,7], [9,83], [0,83]]}], \"loads\": [{\"name\": \"pull, steady\", \"N\": 2385}, {\"name\": " \
    "\"lift\", \"Vy\": 420, \"Mx\": 30150}]}"

reported reported_angle(int no_nu)
{
    utw_error err;
    static const double probe[2][2] = {{4, 60}, {8.9, 6.9}};
    reported r = {stressed_of(no_nu ? ANGLE("", "")
                                    : ANGLE("\"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27, "
                                            "\"yield\": 250}}, ",
                                            "\"material\": \"m\", "),
                              1e-4),
                  NULL, UTW_REPORT_INIT};
    assert_ok(utw_cases_create(r.s.stress, 0, NULL, 2, probe, &r.cases, &err));
    r.report.solution = r.s.solution;
    r.report.cases = r.cases;
    return r;
}

void reported_clear(reported *r)
{
    utw_cases_free(r->cases);
    stressed_clear(&r->s);
}

void reported_without_memory(utw_status (*writer)(const utw_report *, char **, utw_error *))
{
    utw_error err;
    reported r = reported_angle(0);
    int n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        char *text = NULL;
        const long live = utw_memory_live();
        utw_memory_fail_at(++n);
        st = writer(&r.report, &text, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && text == NULL);
        utw_report_free(text);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_true(n > 1);
    reported_clear(&r);
}
