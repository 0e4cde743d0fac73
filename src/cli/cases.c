/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes of a solved section, as commands ask for them. */
#include "cli/cases.h"

#include "base/memory.h"
#include "cli/message.h"
#include "cli/point.h"

/* What the options ask for. */
typedef struct request {
    int n_name, n_probe;
    const char **name;  /* [n_name], owned; the texts are borrowed */
    double (*probe)[2]; /* [n_probe], owned */
} request;

static int read_request(const cli_call *call, request *r)
{
    const cli_given *g;
    r->name = utw_alloc((size_t)call->n_given, sizeof *r->name);
    r->probe = utw_alloc((size_t)call->n_given, sizeof *r->probe);
    if (r->name == NULL || r->probe == NULL) {
        cli_message("out of memory");
        return CLI_NO_RESULT;
    }
    for (; (g = cli_option_given(call, "case", r->n_name)) != NULL; r->n_name++)
        r->name[r->n_name] = g->text;
    for (; (g = cli_option_given(call, "probe", r->n_probe)) != NULL; r->n_probe++) {
        const int status = cli_read_point(call, "probe", g->text, r->probe[r->n_probe]);
        if (status != CLI_DONE) return status;
    }
    return CLI_DONE;
}

/* A case that was named must have a result. */
static int check_named(const utw_cases *cases)
{
    for (int k = 0; k < utw_cases_count(cases); k++) {
        utw_error err;
        const char *name = "";
        if (utw_cases_get(cases, k, &name, NULL, NULL, &err) == UTW_OK) continue;
        cli_message("load case \"%s\": %s", name, err.text);
        return cli_exit_status(err.status);
    }
    return CLI_DONE;
}

int cli_compute_cases(const cli_call *call, const cli_section *section, cli_cases *c)
{
    utw_error err;
    request r = {0, 0, NULL, NULL};
    *c = (cli_cases){NULL, NULL};
    int status = read_request(call, &r);
    const int n_load = utw_outline_load_count(section->outline);
    const int wanted = r.n_name > 0 || r.n_probe > 0 || cli_text(call, "csv") != NULL;
    if (status == CLI_DONE && n_load == 0 && wanted && r.n_name == 0) {
        cli_message("%s: %s has no load cases (\"loads\"), which --probe and --csv need",
                    call->command->name, call->operand[0]);
        status = CLI_INPUT;
    }
    if (status == CLI_DONE && (n_load > 0 || wanted)) {
        utw_status st = utw_stress_create(section->solution, &c->stress, &err);
        if (st == UTW_OK)
            st = utw_cases_create(c->stress, r.n_name, r.name, r.n_probe,
                                  (const double(*)[2])r.probe, &c->cases, &err);
        if (st == UTW_E_MATERIAL && !wanted)
            cli_message("the load cases are left out: %s", err.text);
        else if (st != UTW_OK)
            status = cli_fail(&err);
        else if (r.n_name > 0)
            status = check_named(c->cases);
    }
    utw_free(r.name);
    utw_free(r.probe);
    return status;
}

void cli_clear_cases(cli_cases *c)
{
    utw_cases_free(c->cases);
    utw_stress_free(c->stress);
    *c = (cli_cases){NULL, NULL};
}
