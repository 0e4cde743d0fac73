# SPDX-License-Identifier: GPL-3.0-or-later
# Reads a VTK XML unstructured grid with the VTK library and integrates its point data over the cells with the cells'
# own shape functions, so that what is computed is what a viewer sees. Usage: read_vtu.py FILE; prints the numbers of
# points, of cells and of cells that are Lagrange triangles, the greatest order, then for each array and component a
# line "NAME/COMPONENT integral integral-of-square integral-by-x integral-by-y".
import math
import sys
from vtkmodules.vtkIOXML import vtkXMLUnstructuredGridReader


def gauss(n):
    rule = []
    for k in range(n):
        x = math.cos(math.pi * (k + 0.75) / (n + 0.5))
        for _ in range(50):
            p, q = 1.0, x
            for j in range(2, n + 1):
                p, q = q, ((2 * j - 1) * x * q - (j - 1) * p) / j
            d = n * (x * q - p) / (x * x - 1)
            x -= q / d
        rule.append(((1 + x) / 2, 1 / ((1 - x * x) * d * d)))
    return rule


def triangle_rule(n):  # collapsed: r = u (1 - v), s = v
    return [(u * (1 - v), v, a * b * (1 - v)) for u, a in gauss(n) for v, b in gauss(n)]


reader = vtkXMLUnstructuredGridReader()
reader.SetFileName(sys.argv[1])
reader.Update()
if reader.GetErrorCode() != 0:
    sys.exit("not read: error %d" % reader.GetErrorCode())
grid = reader.GetOutput()
data = grid.GetPointData()
names = [data.GetArrayName(k) for k in range(data.GetNumberOfArrays())]
columns = []
for name in names:
    a = data.GetArray(name)
    for c in range(a.GetNumberOfComponents()):
        columns.append((name + "/%d" % c, [a.GetComponent(i, c) for i in range(a.GetNumberOfTuples())]))
sums = {name: [0.0] * 4 for name, _ in columns}
area = 0.0
lagrange = order = 0
shape = {}  # of an order: rule points with values and derivatives
for k in range(grid.GetNumberOfCells()):
    cell = grid.GetCell(k)
    n = cell.GetNumberOfPoints()
    lagrange += cell.GetCellType() == 69
    p = round((math.sqrt(8 * n + 1) - 3) / 2)
    order = max(order, p)
    if n not in shape:
        shape[n] = []
        for r, s, w in triangle_rule(p + 2):
            v, d = [0.0] * n, [0.0] * (2 * n)
            cell.InterpolateFunctions([r, s, 0.0], v)
            cell.InterpolateDerivs([r, s, 0.0], d)
            shape[n].append((w, v, d[:n], d[n:]))
    ids = [cell.GetPointId(i) for i in range(n)]
    xy = [grid.GetPoint(i) for i in ids]
    local = [(name, [values[i] for i in ids]) for name, values in columns]
    for w, v, dr, ds in shape[n]:
        x, y = (sum(v[i] * xy[i][c] for i in range(n)) for c in (0, 1))
        xr, yr = (sum(dr[i] * xy[i][c] for i in range(n)) for c in (0, 1))
        xs, ys = (sum(ds[i] * xy[i][c] for i in range(n)) for c in (0, 1))
        w = w * (xr * ys - xs * yr)
        area += w
        for name, values in local:
            f = sum(v[i] * values[i] for i in range(n))
            t = sums[name]
            t[0] += w * f
            t[1] += w * f * f
            t[2] += w * f * x
            t[3] += w * f * y
print(grid.GetNumberOfPoints(), grid.GetNumberOfCells(), lagrange, order)
print("area %.15g 0 0 0" % area)
for name, _ in columns:
    print(name.replace(" ", "_"), *("%.15g" % x for x in sums[name]))
