/* SPDX-License-Identifier: GPL-3.0-or-later
 * Three of the example sections against a general-purpose finite-element program, FreeFem++
 * (Hecht, J. Numer. Math. 20 (2012) 251-265), with its own meshes and its own elements.
 *
 * It is given the outline as points, three degrees of arc apart at most, and the problem as a text:
 * the warping function of Saint-Venant's torsion with natural boundary conditions, quadratic
 * elements, three meshes each adapted to the solution on the one before. Its error is judged by its
 * last change. The test is skipped where FreeFem++ is not installed. */
#include <stdio.h>
#include <string.h>

#include "base/vec2.h"
#include "outline/net.h"
#include "support/section.h"

/* Chords for straight sides: as long as a fortieth of the section. */
static int chords_of(const utw_curve *c, double size)
{
    if (c->kind == UTW_LINE) return 1 + (int)(utw_curve_length(c) / (size / 40));
    return 2 + (int)ceil(utw_curve_turning(c) / (3 * UTW_PI / 180));
}

/* One closed border a loop, its points in arrays. */
static int write_loop(FILE *f, const utw_net *net, int l, double size)
{
    const utw_net_loop *loop = &net->loop[l];
    int n = 0;
    for (int pass = 0; pass < 2; pass++) { /* x, then y */
        fprintf(f, "real[int] %c%d=[", "XY"[pass], l);
        n = 0;
        for (int i = 0; i < loop->n; i++) {
            const int ref = loop->ref[i];
            utw_curve c = net->edge[abs(ref) - 1].curve;
            if (ref < 0) c = utw_curve_reversed(&c);
            const int m = chords_of(&c, size);
            for (int k = 0; k < m; k++, n++) {
                double p[2];
                utw_curve_point(&c, (double)k / m, p);
                fprintf(f, "%s%.15g", n > 0 ? ",\n" : "", p[pass]);
            }
        }
        fputs("];\n", f);
    }
    fprintf(f,
            "border l%d(t=0,1){int i=int(t*%d+1e-6)%%%d;real s=t*%d-int(t*%d+1e-6);int j=(i+1)%%"
            "%d; x=X%d[i]+s*(X%d[j]-X%d[i]); y=Y%d[i]+s*(Y%d[j]-Y%d[i]); label=1;}\n",
            l, n, n, n, n, n, l, l, l, l, l, l);
    return n;
}

static const char solver[] =
    "for(int k=0;k<3;k++){\n"
    " fespace Vh(Th,P2); Vh w,v;\n"
    " real A=int2d(Th)(1.),xc=int2d(Th)(x)/A,yc=int2d(Th)(y)/A;\n"
    " real Ixx=int2d(Th)((y-yc)^2),Iyy=int2d(Th)((x-xc)^2),Ixy=int2d(Th)((x-xc)*(y-yc));\n"
    " solve T(w,v,solver=UMFPACK)=int2d(Th)(dx(w)*dx(v)+dy(w)*dy(v)+1e-9/A*w*v)\n"
    "  -int2d(Th)((y-yc)*dx(v)-(x-xc)*dy(v));\n"
    " real J=int2d(Th)((dx(w)-y+yc)^2+(dy(w)+x-xc)^2);\n"
    " real wx=int2d(Th)(w*(x-xc)),wy=int2d(Th)(w*(y-yc)),D=Ixx*Iyy-Ixy^2;\n"
    " cout.precision(12);\n"
    " cout<<\"result \"<<J<<\" \"<<xc+(Ixy*wx-Iyy*wy)/D<<\" \"<<yc+(Ixx*wx-Ixy*wy)/D<<endl;\n"
    " if(k<2) Th=adaptmesh(Th,w,err=k==0?5e-4:1e-4,nbvx=100000,ratio=1.6);\n"
    "}\n";

static void write_problem(const utw_outline *outline, const char *path)
{
    utw_error err;
    utw_net *net = NULL;
    assert_ok(utw_net_create(outline, &net, &err));
    double lo[2] = {UTW_INFINITY, UTW_INFINITY}, hi[2] = {-UTW_INFINITY, -UTW_INFINITY};
    for (int i = 0; i < net->n_node; i++)
        for (int k = 0; k < 2; k++) {
            lo[k] = fmin(lo[k], net->node[i][k]);
            hi[k] = fmax(hi[k], net->node[i][k]);
        }
    FILE *f = fopen(path, "w");
    assert_non_null(f);
    char build[200] = "";
    for (int l = 0; l < net->n_loop; l++) {
        const int n = write_loop(f, net, l, utw_distance(lo, hi));
        const size_t used = strlen(build);
        snprintf(build + used, sizeof build - used, "%sl%d(%d)", l > 0 ? "+" : "", l, n);
    }
    fprintf(f, "mesh Th=buildmesh(%s,fixedborder=1);\n%s", build, solver);
    assert_int_equal(fclose(f), 0);
    utw_net_free(net);
}

/* J, xs, ys on the last two meshes. */
static void run_solver(const char *path, double before[3], double now[3])
{
    char command[400], *output = NULL;
    snprintf(command, sizeof command, "FreeFem++ -nw -v 0 '%s' 2>&1", path);
    const int status = utw_run(command, &output);
    if (status != 0) print_error("%s\n", output);
    assert_int_equal(status, 0);
    int found = 0;
    for (const char *at = output; (at = strstr(at, "result ")) != NULL; at++, found++) {
        memcpy(before, now, 3 * sizeof *now);
        assert_int_equal(sscanf(at, "result %lf %lf %lf", &now[0], &now[1], &now[2]), 3);
    }
    assert_int_equal(found, 3);
    free(output);
}

static void three_examples(void **state)
{
    (void)state;
    static const char *const name[] = {"corner-bracket", "machined-channel", "bulb-flat"};
    static const utw_constant list[3] = {UTW_J, UTW_XS, UTW_YS};
    char *where = NULL;
    const int missing = utw_run("command -v FreeFem++", &where) != 0;
    free(where);
    if (missing) skip();
    for (size_t i = 0; i < sizeof name / sizeof *name; i++) {
        utw_error err;
        utw_outline *o = NULL;
        char path[300];
        double before[3] = {0, 0, 0}, now[3] = {0, 0, 0};
        snprintf(path, sizeof path, "%s/examples/%s.json", UTW_SOURCE_DIR, name[i]);
        assert_ok(utw_outline_read(path, &o, &err));
        utw_solution *s = section_solve(o, 1e-7, 0);
        snprintf(path, sizeof path, "independent-%s.edp", name[i]);
        write_problem(o, path);
        run_solver(path, before, now);
        remove(path);
        const double size = section_constant(s, UTW_RX).value + section_constant(s, UTW_RY).value;
        for (int k = 0; k < 3; k++) {
            const utw_quantity q = section_constant(s, (int)list[k]);
            const double scale = k == 0 ? q.value : size, change = fabs(now[k] - before[k]);
            const double error = fmax(change, 2e-5 * scale); /* chords of three degrees: 1e-5 */
            if (getenv("UTW_SHOW") != NULL)
                print_message("%s %d: %.9g here, %.9g there, changed by %.1e of %.3g\n", name[i], k,
                              q.value, now[k], change / scale, scale);
            assert_true(error < 2e-3 * scale);
            assert_true(fabs(now[k] - q.value) <= error);
        }
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(three_examples)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
