/* SPDX-License-Identifier: GPL-3.0-or-later
 * Keys, meanings and dimensions of the constants. */
#include "untwist.h"

typedef struct constant_row {
    const char *key, *meaning;
    int power;
} constant_row;

static const constant_row rows[UTW_CONSTANT_COUNT] = {
    [UTW_A] = {"A", "area", 2},
    [UTW_PERIMETER] = {"perimeter", "length of all boundaries", 1},
    [UTW_XC] = {"xc", "centroid, x", 1},
    [UTW_YC] = {"yc", "centroid, y", 1},
    [UTW_IXX] = {"Ixx", "second moment, int y^2 dA", 4},
    [UTW_IYY] = {"Iyy", "second moment, int x^2 dA", 4},
    [UTW_IXY] = {"Ixy", "product moment, int x y dA", 4},
    [UTW_I1] = {"I1", "greater principal second moment", 4},
    [UTW_I2] = {"I2", "smaller principal second moment", 4},
    [UTW_ANGLE] = {"angle", "from x to the axis of I1", 0},
    [UTW_RX] = {"rx", "radius of gyration, sqrt(Ixx/A)", 1},
    [UTW_RY] = {"ry", "radius of gyration, sqrt(Iyy/A)", 1},
    [UTW_WX_TOP] = {"Wx_top", "elastic modulus, top fibre", 3},
    [UTW_WX_BOTTOM] = {"Wx_bottom", "elastic modulus, bottom fibre", 3},
    [UTW_WY_LEFT] = {"Wy_left", "elastic modulus, left fibre", 3},
    [UTW_WY_RIGHT] = {"Wy_right", "elastic modulus, right fibre", 3},
    [UTW_ZX] = {"Zx", "plastic modulus, axis along x", 3},
    [UTW_ZY] = {"Zy", "plastic modulus, axis along y", 3},
    [UTW_XP] = {"xp", "plastic neutral axis x = xp", 1},
    [UTW_YP] = {"yp", "plastic neutral axis y = yp", 1},
    [UTW_J] = {"J", "torsion constant (Saint-Venant)", 4},
    [UTW_WT] = {"Wt", "torsion modulus, T / tau_max", 3},
    [UTW_XS] = {"xs", "shear centre, x", 1},
    [UTW_YS] = {"ys", "shear centre, y", 1},
    [UTW_XF] = {"xf", "centre of flexure at nu, x", 1},
    [UTW_YF] = {"yf", "centre of flexure at nu, y", 1},
    [UTW_IW] = {"Iw", "warping constant, pole (xs, ys)", 6},
    [UTW_ASX] = {"Asx", "shear area for Vx", 2},
    [UTW_ASY] = {"Asy", "shear area for Vy", 2},
    [UTW_KX] = {"kx", "shear factor, Asx/A", 0},
    [UTW_KY] = {"ky", "shear factor, Asy/A", 0},
    [UTW_BETAX] = {"betax", "monosymmetry coefficient for Mx", 1},
    [UTW_BETAY] = {"betay", "monosymmetry coefficient for My", 1},
    [UTW_R0] = {"r0", "polar radius, pole (xs, ys)", 1},
};

static int known(utw_constant which)
{
    return (int)which >= 0 && which < UTW_CONSTANT_COUNT;
}

const char *utw_constant_key(utw_constant which)
{
    return known(which) ? rows[which].key : NULL;
}

const char *utw_constant_meaning(utw_constant which)
{
    return known(which) ? rows[which].meaning : NULL;
}

int utw_constant_power(utw_constant which)
{
    return known(which) ? rows[which].power : 0;
}
