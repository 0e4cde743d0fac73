/* SPDX-License-Identifier: GPL-3.0-or-later
 * Area, second moments, principal frame, quadrature stations, Bredt-Batho torsion. */
#include "thinwall/theory.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "thinwall/cells.h"

/* Second moments of all walls about the origin of the paths: int y^2 t, int x^2 t, int x y t ds. */
static void second_moments(const utw_thin *thin, double sum[3])
{
    sum[0] = sum[1] = sum[2] = 0;
    for (int w = 0; w < thin->graph.n_walls; w++) {
        const utw_path *path = &thin->paths[w];
        for (int i = 0; i < utw_path_pieces(path); i++) {
            double range[2];
            utw_path_piece(path, i, range);
            for (int g = 0; g < UTW_PATH_GAUSS; g++) {
                utw_path_point at;
                const double h = range[1] - range[0];
                utw_path_at(path, range[0] + h * thin->rule.x[g], &at);
                const double da = at.t * h * thin->rule.w[g];
                sum[0] += at.x[1] * at.x[1] * da;
                sum[1] += at.x[0] * at.x[0] * da;
                sum[2] += at.x[0] * at.x[1] * da;
            }
        }
    }
}

/* Angle of the axis of the greater second moment, in (-pi/2, pi/2]; 0 when all axes are principal
 * to rounding. */
static double principal_angle(double ixx, double iyy, double ixy)
{
    const double mean = (ixx + iyy) / 2, half = (ixx - iyy) / 2;
    if (hypot(half, ixy) <= 1e-14 * mean) return 0;
    if (fabs(ixy) <= 1e-15 * mean) return half > 0 ? 0 : UTW_PI / 2;
    return atan2(-ixy, half) /
           2; /* Mohr: tan 2a = -2 Ixy / (Ixx - Iyy), on the side of the greater one */
}

void utw_theory_area(utw_thin *thin, const double origin[2])
{
    utw_thin_constants *k = &thin->constants;
    double moment[2] = {0, 0}, sum[3];
    for (int w = 0; w < thin->graph.n_walls; w++) {
        utw_path_run run;
        utw_path_run_to(&thin->paths[w], &thin->rule, thin->paths[w].length, &run);
        thin->area += run.area;
        k->length += thin->paths[w].length;
        for (int i = 0; i < 2; i++) moment[i] += run.moment[i];
    }
    const double shift[2] = {moment[0] / thin->area, moment[1] / thin->area};
    for (int w = 0; w < thin->graph.n_walls; w++) utw_path_to_frame(&thin->paths[w], shift, 1, 0);
    second_moments(thin, sum);
    k->A = thin->area;
    k->xc = thin->centroid[0] = origin[0] + shift[0];
    k->yc = thin->centroid[1] = origin[1] + shift[1];
    k->Ixx = sum[0];
    k->Iyy = sum[1];
    k->Ixy = sum[2];
    k->angle = principal_angle(sum[0], sum[1], sum[2]);
    /* the frame takes the principal axis within 45 degrees of x, so that an upright section is not
     * turned at all */
    double turn = k->angle;
    if (turn > UTW_PI / 4) turn -= UTW_PI / 2;
    if (turn <= -UTW_PI / 4) turn += UTW_PI / 2;
    thin->cos_frame = cos(turn);
    thin->sin_frame = sin(turn);
    if (turn != 0) {
        const double zero[2] = {0, 0};
        for (int w = 0; w < thin->graph.n_walls; w++)
            utw_path_to_frame(&thin->paths[w], zero, thin->cos_frame, thin->sin_frame);
        second_moments(thin, sum);
    }
    thin->i11 = sum[0];
    thin->i22 = sum[1];
    thin->i12 = sum[2];
    k->I1 = fmax(sum[0], sum[1]);
    k->I2 = fmin(sum[0], sum[1]);
    /* all walls on one line to 1e-9 of its length: int d^2 dA below 1e-18 of the greater moment */
    k->straight = k->I2 <= 1e-18 * k->I1;
}

utw_status utw_theory_points(utw_thin *thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int n = thin->graph.n_walls;
    UTW_TRY_ALLOC(thin->first = utw_alloc((size_t)n + 1, sizeof *thin->first));
    for (int w = 0; w < n; w++)
        thin->first[w + 1] = thin->first[w] + UTW_PATH_GAUSS * utw_path_pieces(&thin->paths[w]);
    UTW_TRY_ALLOC(thin->points = utw_alloc((size_t)thin->first[n], sizeof *thin->points));
    for (int w = 0; w < n; w++) {
        const utw_path *path = &thin->paths[w];
        utw_thin_point *p = &thin->points[thin->first[w]];
        for (int i = 0; i < utw_path_pieces(path); i++) {
            double range[2];
            utw_path_piece(path, i, range);
            for (int g = 0; g < UTW_PATH_GAUSS; g++, p++) {
                p->s = range[0] + (range[1] - range[0]) * thin->rule.x[g];
                p->ds = (range[1] - range[0]) * thin->rule.w[g];
                utw_path_at(path, p->s, &p->at);
                utw_path_run_to(path, &thin->rule, p->s, &p->run);
            }
        }
    }
    st = UTW_OK;
done:
    return st;
}

/* int t^3/3 ds of a linear taper: (t0^3 + t0^2 t1 + t0 t1^2 + t1^3)/12 per length. */
static double open_part(const utw_path *w)
{
    return w->length * (w->t0 + w->t1) * (w->t0 * w->t0 + w->t1 * w->t1) / 12;
}

utw_status utw_theory_torsion(utw_thin *thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int n = thin->graph.n_walls;
    utw_thin_constants *k = &thin->constants;
    double *sector = NULL, greatest = 0;
    UTW_TRY_ALLOC(sector = utw_alloc((size_t)n, sizeof *sector));
    UTW_TRY_ALLOC(thin->bredt = utw_alloc((size_t)n, sizeof *thin->bredt));
    for (int w = 0; w < n; w++) sector[w] = utw_path_sector(&thin->paths[w], thin->paths[w].length);
    /* around each cell int q/t ds = G theta' int r_n ds = G theta' 2 A_i: the cells all twist alike
     */
    UTW_TRY(utw_cells_close(thin, sector, thin->bredt, err));
    for (int w = 0; w < n; w++) {
        const utw_path *path = &thin->paths[w];
        k->J_bredt += thin->bredt[w] * sector[w]; /* moment of the flows: int q r_n ds */
        k->J_open += open_part(path);
        /* |q/t| + t, stress per G theta' at a face, is convex in t: greatest at an end of the wall
         */
        const double q = fabs(thin->bredt[w]);
        greatest = fmax(greatest, fmax(q / path->t0 + path->t0, q / path->t1 + path->t1));
    }
    k->J = k->J_bredt + k->J_open;
    k->Wt = k->J / greatest;
    st = UTW_OK;
done:
    utw_free(sector);
    return st;
}
