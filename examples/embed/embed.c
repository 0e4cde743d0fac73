/* SPDX-License-Identifier: GPL-3.0-or-later
 * How the web thickness of the machined channel changes its torsion constant and its shear centre:
 * the library from a program of one's own. Usage: embed machined-channel.json */
#include <stdio.h>

#include <untwist.h>

/* One row of the table: the section with another web thickness. */
static utw_status row(const char *path, double t_web, utw_error *err)
{
    char set[64];
    const char *const settings[] = {set};
    utw_outline *outline = NULL;
    utw_solution *solution = NULL;
    utw_quantity A, J, xs;
    snprintf(set, sizeof set, "t_web=%g", t_web);
    utw_status st = utw_outline_read_with(path, 1, settings, &outline, err);
    if (st == UTW_OK) st = utw_solve(outline, NULL, &solution, err);
    if (st == UTW_OK) st = utw_solution_constant(solution, UTW_A, &A, err);
    if (st == UTW_OK) st = utw_solution_constant(solution, UTW_J, &J, err);
    if (st == UTW_OK) st = utw_solution_constant(solution, UTW_XS, &xs, err);
    if (st == UTW_OK)
        printf("%7.3f %9.5f %12.8f .. %.8f %13.8f .. %.8f\n", t_web, A.value, J.low, J.high, xs.low,
               xs.high);
    utw_solution_free(solution);
    utw_outline_free(outline);
    return st;
}

int main(int argc, char **argv)
{
    utw_error err;
    if (argc != 2) {
        fprintf(stderr, "usage: embed machined-channel.json\n");
        return 2;
    }
    printf("untwist %s\n  t_web         A   J: low and high            xs: low and high\n",
           utw_version());
    for (int i = 0; i <= 4; i++)
        if (row(argv[1], 0.16 + 0.03 * i, &err) != UTW_OK) {
            fprintf(stderr, "embed: %s\n", err.text);
            return 1;
        }
    return 0;
}
