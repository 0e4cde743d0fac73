/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist compare: the thin-walled idealisation of a section beside its solid solution. */
#include <stdio.h>
#include <string.h>

#include "base/nearest.h"
#include "cli/commands.h"
#include "cli/message.h"
#include "cli/output.h"
#include "cli/section.h"

#define STUDY_TOLERANCE                                                                            \
    1e-4          /* of each step, unless asked for otherwise: a hundredth of a per cent */
#define LIMIT 5.0 /* per cent: common practice for hand calculations */

/* What is compared of one section. */
typedef struct work {
    cli_section section;
    utw_outline *other; /* drawn by the midline to be taken */
    utw_idealisation *idealisation;
    utw_comparison *comparison;
    utw_study *study;
} work;

static int fail_at(const char *option, const utw_error *err)
{
    cli_message("%s: %s", option, err->text);
    return cli_exit_status(err->status);
}

/* The idealisation: found in the outline, or the midline of another file. */
static int idealise(const cli_call *call, work *w)
{
    utw_error err;
    const char *file = cli_text(call, "with");
    if (file == NULL)
        return utw_idealise(w->section.outline, &w->idealisation, &err) == UTW_OK ? CLI_DONE
                                                                                  : cli_fail(&err);
    if (utw_outline_read(file, &w->other, &err) != UTW_OK) return fail_at("--with", &err);
    const utw_midline *midline = utw_outline_midline(w->other);
    if (midline == NULL) {
        cli_message("--with: %s holds no \"midline\"; docs/section-file.md says how one is drawn",
                    file);
        return CLI_INPUT;
    }
    return utw_idealise_as(w->section.outline, midline, &w->idealisation, &err) == UTW_OK
               ? CLI_DONE
               : fail_at("--with", &err);
}

static const utw_compared *row_of(const utw_comparison *c, const char *key)
{
    for (int k = 0; k < utw_comparison_count(c); k++)
        if (strcmp(utw_constant_key(utw_comparison_get(c, k)->which), key) == 0)
            return utw_comparison_get(c, k);
    return NULL;
}

/* The keys of --require are checked before anything is solved. */
static int check_required(const cli_call *call)
{
    static const utw_constant known[] = {UTW_A,   UTW_XC, UTW_YC, UTW_IXX, UTW_IYY,
                                         UTW_IXY, UTW_I1, UTW_I2, UTW_J,   UTW_WT,
                                         UTW_XS,  UTW_YS, UTW_IW, UTW_ASX, UTW_ASY};
    enum { N = sizeof known / sizeof known[0] };
    const char *word[N];
    for (int k = 0; k < N; k++) word[k] = utw_constant_key(known[k]);
    for (int n = 0; cli_option_given(call, "require", n) != NULL; n++) {
        const char *key = cli_option_given(call, "require", n)->text;
        int found = 0;
        for (int k = 0; k < N; k++) found |= strcmp(word[k], key) == 0;
        if (found) continue;
        const int nearest = utw_nearest_word(key, word, N);
        if (nearest >= 0)
            cli_message("--require: '%s' is not compared; did you mean '%s'?", key, word[nearest]);
        else
            cli_message("--require: '%s' is not compared; these are: A, xc, yc, Ixx, Iyy, Ixy, I1, "
                        "I2, J, Wt, xs, ys, Iw, Asx, Asy",
                        key);
        return CLI_USAGE;
    }
    return CLI_DONE;
}

static int judge_required(const cli_call *call, const utw_comparison *c)
{
    int status = CLI_DONE;
    for (int n = 0; cli_option_given(call, "require", n) != NULL; n++) {
        const char *key = cli_option_given(call, "require", n)->text;
        const utw_compared *row = row_of(c, key);
        if (row->absent != NULL)
            cli_message("required: %s is not there to compare: %s", key, row->absent);
        else if (!row->within)
            cli_message("required: %s is not within %g %%", key, 100 * utw_comparison_limit(c));
        else
            continue;
        status = CLI_SAYS_NO;
    }
    return status;
}

/* The midline as a section file. What cannot be thickened as it stands is told: links overlap
 * walls. */
static int write_midline(const cli_call *call, const work *w)
{
    utw_error err;
    const char *path = cli_text(call, "midline");
    const utw_midline *m = utw_idealisation_midline(w->idealisation);
    char *text = NULL;
    utw_outline *thickened = NULL;
    if (path == NULL) return CLI_DONE;
    if (utw_midline_file(m, utw_outline_name(w->section.outline),
                         utw_outline_units(w->section.outline), &text, &err) != UTW_OK)
        return cli_fail(&err);
    const int status = cli_write(path, text);
    utw_report_free(text);
    if (status == CLI_DONE && utw_outline_from_midline(m, utw_outline_units(w->section.outline),
                                                       &thickened, &err) != UTW_OK)
        cli_message("--midline: %s is written, and must be edited before it can be solved: %s",
                    path, err.text);
    utw_outline_free(thickened);
    return status;
}

/* FROM:TO:STEPS */
static int read_range(const cli_call *call, utw_study_range *range)
{
    const char *text = cli_text(call, "thickness");
    int used = -1;
    double steps = 0;
    if (text == NULL) return CLI_DONE;
    if (strspn(text, "0123456789.eE+-:") == strlen(text) &&
        sscanf(text, "%lf:%lf:%lf%n", &range->from, &range->to, &steps, &used) == 3 &&
        text[used] == '\0' && range->from >= 1e-3 && range->from < range->to && range->to <= 1e3 &&
        steps >= 2 && steps <= 500 && steps == (int)steps) {
        range->steps = (int)steps;
        return CLI_DONE;
    }
    cli_message(
        "compare: --thickness takes FROM:TO:STEPS, rising factors from 0.001 to 1000 in 2 to "
        "500 steps, such as 0.25:3:12, not '%s'",
        text);
    return CLI_USAGE;
}

static int run_study(const cli_call *call, const utw_study_range *range, work *w)
{
    utw_error err;
    utw_options options = UTW_OPTIONS_INIT;
    if (cli_text(call, "thickness") == NULL) return CLI_DONE;
    options.tolerance = STUDY_TOLERANCE;
    cli_solving_options(call, &options);
    if (utw_thickness_study(w->section.outline, w->idealisation, &options, range,
                            utw_comparison_limit(w->comparison), &w->study, &err) == UTW_OK)
        return CLI_DONE;
    return fail_at("--thickness", &err);
}

static int write_reports(const cli_call *call, const work *w)
{
    const char *json = cli_text(call, "json");
    utw_report report = UTW_REPORT_INIT;
    report.solution = w->section.solution;
    report.comparison = w->comparison;
    report.study = w->study;
    int status = CLI_DONE;
    if (json != NULL) status = cli_write_report(utw_report_json, &report, json);
    if (status == CLI_DONE && !cli_flag(call, "quiet") && !cli_to_output(call, "json") &&
        !cli_to_output(call, "midline"))
        status = cli_write_report(utw_report_comparison, &report, "-");
    return status;
}

static int check_files(const cli_call *call)
{
    int status = cli_check_overwrite(call, "json");
    if (status == CLI_DONE) status = cli_check_overwrite(call, "midline");
    if (status != CLI_DONE || !cli_to_output(call, "json") || !cli_to_output(call, "midline"))
        return status;
    cli_message("compare: --json and --midline cannot both go to standard output");
    return CLI_USAGE;
}

static int run(const cli_call *call)
{
    work w = {{NULL, NULL}, NULL, NULL, NULL, NULL};
    utw_error err;
    utw_study_range range = {1, 1, 2};
    int status = check_files(call);
    if (status == CLI_DONE) status = check_required(call);
    if (status == CLI_DONE) status = read_range(call, &range);
    if (status == CLI_DONE) status = cli_read_section(call, &w.section);
    /* the midline first: a section that has none needs no solution */
    if (status == CLI_DONE) status = idealise(call, &w);
    if (status == CLI_DONE) status = write_midline(call, &w);
    if (status == CLI_DONE) status = cli_solve_read_section(call, &w.section);
    if (status == CLI_DONE &&
        utw_compare(w.section.solution, w.idealisation, 0.01 * cli_number(call, "limit", LIMIT),
                    &w.comparison, &err) != UTW_OK)
        status = cli_fail(&err);
    int studied = CLI_DONE;
    if (status == CLI_DONE) studied = run_study(call, &range, &w);
    if (status == CLI_DONE) status = write_reports(call, &w);
    if (status == CLI_DONE) status = studied;
    if (status == CLI_DONE) status = judge_required(call, w.comparison);
    if (status == CLI_DONE) status = cli_check_reached(w.section.solution);
    utw_study_free(w.study);
    utw_comparison_free(w.comparison);
    utw_idealisation_free(w.idealisation);
    utw_outline_free(w.other);
    cli_clear_section(&w.section);
    return status;
}

static const cli_option options[] = {
    {"limit", "PERCENT",
     "The greatest difference at which the thin-walled value may stand for the solid one, 0.0001 "
     "to "
     "100. Without it: 5.",
     CLI_NUMBER, 1e-4, 100, 0},
    {"require", "NAME",
     "Exit with status 1 when this quantity, such as J, is not within the limit. May be repeated.",
     CLI_TEXT, 0, 0, 1},
    {"midline", "FILE",
     "Write the midline as a section file to FILE, to be edited; '-' is standard output, without "
     "the table.",
     CLI_TEXT, 0, 0, 0},
    {"with", "FILE",
     "Take the midline of this section file in place of the one in the drawing or found in it.",
     CLI_TEXT, 0, 0, 0},
    {"thickness", "FROM:TO:STEPS",
     "Compare again with all walls of the midline these factors times as thick, such as 0.25:3:12, "
     "and say where each quantity crosses the limit.",
     CLI_TEXT, 0, 0, 0},
    CLI_SOLVING_OPTIONS,
    {"json", "FILE",
     "Write all results as JSON to FILE; '-' is standard output, without the table.", CLI_TEXT, 0,
     0, 0},
    {"quiet", NULL, "Print no table.", CLI_FLAG, 0, 0, 0},
};

const cli_command cli_compare = {
    "compare",
    "FILE",
    "whether the thin-walled hand calculation holds",
    "Reads a section file ('-' is standard input), finds the midline in the drawing (a midline "
    "drawing keeps its own), does the thin-walled calculation in full, solves the drawn section, "
    "and says for which quantities the thin-walled value may stand. A section without thin-walled "
    "sense ends with a sentence that says so and status 4.",
    1,
    1,
    sizeof options / sizeof options[0],
    options,
    run,
};
