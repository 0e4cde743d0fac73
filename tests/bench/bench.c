/* SPDX-License-Identifier: GPL-3.0-or-later
 * Timing of the solver, run by hand: one JSON line a case. Usage:
 *   bench [--tol T] [--runs N] FILE...     medians of N runs of read, mesh, solve with every stage
 *   bench --million FILE                   one solution of order 2 with about a million unknowns
 *   bench --loop N FILE                    N solutions in a row; memory at the start and at the end
 * Times are milliseconds inside the process; loading the libraries is over before main. */
#include <limits.h>
#include <malloc.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/resource.h>

#include "base/clock.h"
#include "section/solution.h"

enum { MOST_RUNS = 101 };

typedef struct timing {
    double read, mesh, solve, total;
} timing;

static double peak_mib(void)
{
    struct rusage usage;
    getrusage(RUSAGE_SELF, &usage);
    return (double)usage.ru_maxrss / 1024;
}

/* Resident memory now, in MiB. */
static double resident_mib(void)
{
    long pages = 0, resident = 0;
    FILE *f = fopen("/proc/self/statm", "r");
    if (f == NULL || fscanf(f, "%ld %ld", &pages, &resident) != 2) resident = 0;
    if (f != NULL) fclose(f);
    return (double)resident * 4096 / 1048576;
}

static int by_total(const void *a, const void *b)
{
    const double x = ((const timing *)a)->total, y = ((const timing *)b)->total;
    return (x > y) - (x < y);
}

/* One run; the solution is kept when `keep` is given. */
static int run_once(const char *file, const utw_options *options, timing *t, utw_solution **keep, utw_outline **outline)
{
    utw_error err;
    utw_outline *o = NULL;
    utw_solution *s = NULL;
    const double start = utw_seconds();
    if (utw_outline_read(file, &o, &err) != UTW_OK) {
        fprintf(stderr, "%s\n", err.text);
        return -1;
    }
    const double read = utw_seconds();
    if (utw_solve(o, options, &s, &err) != UTW_OK) {
        fprintf(stderr, "%s: %s\n", file, err.text);
        utw_outline_free(o);
        return -1;
    }
    const double end = utw_seconds();
    utw_solution_info info;
    utw_solution_get_info(s, &info);
    *t = (timing){1e3 * (read - start), 1e3 * info.seconds_mesh, 1e3 * info.seconds_solve, 1e3 * (end - start)};
    if (keep != NULL) {
        *keep = s;
        *outline = o;
        return 0;
    }
    utw_solution_free(s);
    utw_outline_free(o);
    return 0;
}

static int bench_case(const char *file, const utw_options *options, int runs, double idle)
{
    timing t[MOST_RUNS], last;
    utw_solution *s = NULL;
    utw_outline *o = NULL;
    for (int i = 0; i < runs; i++)
        if (run_once(file, options, &t[i], NULL, NULL) != 0) return -1;
    if (run_once(file, options, &last, &s, &o) != 0) return -1;
    qsort(t, (size_t)runs, sizeof *t, by_total);
    const timing *m = &t[runs / 2];
    utw_solution_info info;
    utw_quantity J = {0, 0, 0, UTW_BRACKET};
    utw_error err;
    utw_solution_get_info(s, &info);
    if (utw_solution_constant(s, UTW_J, &J, &err) != UTW_OK) return -1;
    const utw_field_times *f = &s->solved.field->times;
    const char *name = strrchr(file, '/');
    printf("{\"case\": \"%s\", \"tolerance\": %g, \"gap\": %.2g, \"J_low\": %.12g, \"J_high\": %.12g, "
           "\"triangles\": %d, \"order\": [%d, %d], \"unknowns\": %d, \"skeleton\": [%d, %d], \"rounds\": %d, "
           "\"ms\": {\"read\": %.2f, \"mesh\": %.2f, \"solve\": %.2f, \"total\": %.2f, \"least\": %.2f, \"most\": %.2f}, "
           "\"last_round_ms\": {\"elements\": %.2f, \"analyse\": %.2f, \"factorise\": %.2f, \"back\": %.2f, \"recover\": %.2f}, "
           "\"cholmod_ms\": %.2f, \"mib_beyond_idle\": %.1f, \"runs\": %d}\n",
           name == NULL ? file : name + 1, info.tolerance, info.gap, J.low, J.high, info.triangles, info.least_order,
           info.greatest_order, info.unknowns, s->solved.field->n_skeleton_free, s->solved.field->n_skeleton_clamped,
           info.rounds, m->read, m->mesh, m->solve, m->total, t[0].total, t[runs - 1].total, 1e3 * f->elements,
           1e3 * f->analyse, 1e3 * f->factorise, 1e3 * f->solve, 1e3 * f->recover,
           1e3 * (f->analyse + f->factorise + f->solve), peak_mib() - idle, runs);
    fflush(stdout);
    utw_solution_free(s);
    utw_outline_free(o);
    return 0;
}

/* Halve the element size until order 2 has a million unknowns (unknowns grow with the square of the fineness). */
static int bench_million(const char *file)
{
    /* freed memory is kept by the process: giving gigabytes back and forth costs as much as the mesh */
    mallopt(M_MMAP_MAX, 0);
    mallopt(M_TRIM_THRESHOLD, INT_MAX);
    mallopt(M_TOP_PAD, 64 << 20);
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = 2;
    options.mesh_scale = 0.05;
    timing t;
    utw_solution *s = NULL;
    utw_outline *o = NULL;
    if (run_once(file, &options, &t, &s, &o) != 0) return -1;
    utw_solution_info info;
    utw_solution_get_info(s, &info);
    options.mesh_scale *= sqrt(info.unknowns / 1e6);
    utw_solution_free(s);
    utw_outline_free(o);
    if (run_once(file, &options, &t, &s, &o) != 0) return -1;
    utw_solution_get_info(s, &info);
    const utw_field_times *f = &s->solved.field->times;
    printf("{\"case\": \"million\", \"triangles\": %d, \"unknowns\": %d, \"gap\": %.2g, \"seconds\": {\"mesh\": %.1f, "
           "\"elements\": %.1f, \"analyse\": %.1f, \"factorise\": %.1f, \"back\": %.1f, \"recover\": %.1f, \"solve\": %.1f, "
           "\"total\": %.1f}, \"peak_mib\": %.0f}\n",
           info.triangles, info.unknowns, info.gap, t.mesh / 1e3, f->elements, f->analyse, f->factorise, f->solve, f->recover,
           t.solve / 1e3, t.total / 1e3, peak_mib());
    utw_solution_free(s);
    utw_outline_free(o);
    return 0;
}

static int bench_loop(const char *file, int n)
{
    timing first, t;
    if (run_once(file, NULL, &first, NULL, NULL) != 0) return -1;
    double tenth = 0, hundred = 0;
    const double start = utw_seconds();
    for (int i = 0; i < n; i++) {
        if (run_once(file, NULL, &t, NULL, NULL) != 0) return -1;
        if (i == n / 10) {
            tenth = resident_mib();
            hundred = utw_seconds() - start;
        }
    }
    printf("{\"case\": \"loop\", \"solutions\": %d, \"mib_after_a_tenth\": %.1f, \"mib_at_the_end\": %.1f, "
           "\"ms_each_first_tenth\": %.2f, \"ms_each\": %.2f}\n",
           n, tenth, resident_mib(), 1e3 * hundred / (n / 10 + 1), 1e3 * (utw_seconds() - start) / n);
    return 0;
}

int main(int argc, char **argv)
{
    utw_options options = UTW_OPTIONS_INIT;
    int runs = 11, bad = 0;
    const double idle = peak_mib();
    for (int i = 1; i < argc; i++) {
        if (strcmp(argv[i], "--tol") == 0 && i + 1 < argc) options.tolerance = strtod(argv[++i], NULL);
        else if (strcmp(argv[i], "--runs") == 0 && i + 1 < argc) runs = (int)strtol(argv[++i], NULL, 10);
        else if (strcmp(argv[i], "--million") == 0 && i + 1 < argc) bad |= bench_million(argv[++i]);
        else if (strcmp(argv[i], "--loop") == 0 && i + 2 < argc) {
            const int n = (int)strtol(argv[i + 1], NULL, 10);
            bad |= bench_loop(argv[i + 2], n);
            i += 2;
        } else if (runs < 1 || runs > MOST_RUNS) return 2;
        else bad |= bench_case(argv[i], &options, runs, idle);
    }
    return bad ? 1 : 0;
}
