"""The runoff curve number of the reference model.

USDA, Urban Hydrology for Small Watersheds (TR-55), 1986, equations 2-1 to 2-4, applied to
cumulative rain. The conversion for a ratio of 0.05 is that of Hawkins and others, "Runoff curve
number method: examination of the initial abstraction ratio", 2002. Antecedent conditions I and
III: USDA NRCS, National Engineering Handbook Part 630 chapter 10, table 10-1 (from memory, but
for the rows 100 to 30 by tens, which Beven, Rainfall-Runoff Modelling: The Primer, table B6.3.2,
reprints).
"""

from bisect import bisect_left
from fractions import Fraction

from mpmath import inf, mpf

from laws import real

# CN II: CN I / CN III
TABLE_10_1 = """
100:100/100 99:97/100 98:94/99 97:91/99 96:89/99 95:87/98 94:85/98 93:83/98 92:81/97 91:80/97
90:78/96 89:76/96 88:75/95 87:73/95 86:72/94 85:70/94 84:68/93 83:67/93 82:66/92 81:64/92
80:63/91 79:62/91 78:60/90 77:59/89 76:58/89 75:57/88 74:55/88 73:54/87 72:53/86 71:52/86
70:51/85 69:50/84 68:48/84 67:47/83 66:46/82 65:45/82 64:44/81 63:43/80 62:42/79 61:41/78
60:40/78 59:39/77 58:38/76 57:37/75 56:36/75 55:35/74 54:34/73 53:33/72 52:32/71 51:31/70
50:31/70 49:30/69 48:29/68 47:28/67 46:27/66 45:26/65 44:25/64 43:25/63 42:24/62 41:23/61
40:22/60 39:21/59 38:21/58 37:20/57 36:19/56 35:18/55 34:18/54 33:17/53 32:16/52 31:16/51
30:15/50 25:12/43 20:9/37 15:6/30 10:4/22 5:2/13
"""
ROWS = sorted(tuple(int(n) for n in row.replace("/", ":").split(":"))
              for row in TABLE_10_1.split())


def converted(number, antecedent):
    """The number at antecedent condition I, II or III, interpolated between the table's rows."""
    if antecedent == "II":
        return number
    column = 1 if antecedent == "I" else 2
    at = bisect_left([row[0] for row in ROWS], number)
    below, above = ROWS[max(at - 1, 0)], ROWS[at]
    if above[0] == number:
        return Fraction(above[column])
    part = (number - below[0]) / (above[0] - below[0])
    return below[column] + part * (above[column] - below[column])


def retention(given):
    """(S, Ia) in mm."""
    number = converted(given["number"], given.get("antecedent", "II"))
    ratio = real(given.get("initial_abstraction_ratio", Fraction(1, 5)))
    S = real(25400 / number - 254)
    if "tabulated_ratio" in given and given["initial_abstraction_ratio"] == Fraction(1, 20):
        inches = S / mpf("25.4")
        S = mpf("1.33") * inches ** mpf("1.15") * mpf("25.4")
    return S, ratio * S


def split(P, S, Ia):
    """(initial abstraction, continuing abstraction, runoff) of a cumulative rain P."""
    if P <= Ia:
        return P, mpf(0), mpf(0)
    beyond = P - Ia
    return Ia, S * beyond / (beyond + S), beyond * beyond / (beyond + S)


def march_curve_number(surface, pieces, steps):
    S, Ia = retention(surface["parameters"])
    names = ("initial_loss", "infiltrated", "excess")
    rows = {name: [mpf(0)] * steps for name in ("rain", "run_on", "ponded") + names}
    P, before, start, margin, outflow = mpf(0), split(mpf(0), S, Ia), None, inf, []
    for piece in pieces:
        step, dt = piece["step"], piece["end"] - piece["start"]
        w = piece["rain"] + piece["run_on"]
        if start is None and w > 0 and P + w * dt > Ia:
            start = piece["start"] + (Ia - P) / w
        P += w * dt
        margin = min(margin, abs(P - Ia)) if P != Ia else margin
        rows["rain"][step] += piece["rain"] * dt
        rows["run_on"][step] += piece["run_on"] * dt
        now = split(P, S, Ia)
        for name, a, b in zip(names, before, now):
            rows[name][step] += b - a
        outflow.append((piece["start"], piece["end"], now[2] - before[2]))
        before = now
    return {"rows": rows, "capacities": [None] * steps, "ponding": [], "runoff_start": start,
            "outflow": outflow, "margin": margin, "events": [] if start is None else [start]}
