"""Infiltration laws of the reference model, at 45 significant digits.

Every law answers the same few questions about a position x (the infiltrated depth, or the clock
for elapsed-time Horton); nothing is stored in the law but its parameters.

  capacity(x)     mm/h at x; infinite where unlimited
  can_fall_to(x, w)  whether capacity falls continuously to w and below from x on
  floor           what capacity never falls to (below every rate where it does not matter)
  fill(x, dt)     (depth taken at capacity during dt, new x)
  take(x, w, dt)  new x after taking w, below capacity, during dt; w = 0 is rest
  wait(x, w)      (time, new x) taking w until the capacity has fallen to w or the law changes form
  bend(x)         (time, new x) at capacity until the law changes form
  slack(x, w)     time at capacity until the capacity has fallen to w

Sources. Horton, "An approach toward a physical interpretation of infiltration-capacity", 1940.
Green and Ampt, "Studies on soil physics", 1911; under rain as Mein and Larson, "Modeling
infiltration during a steady rain", 1973. Philip, "The theory of infiltration: 4", 1957. The roots
are taken by the Lambert W function: Corless and others, "On the Lambert W function", 1996. Titles
from memory.
"""

from mpmath import exp, expm1, inf, lambertw, log, log1p, mp, mpf, sqrt

mp.dps = 45
NEVER = (inf, None)


class Constant:
    """A capacity that never changes. x is the infiltrated depth."""

    floor = -inf

    def __init__(self, rate):
        self.rate = rate

    def capacity(self, x):
        return self.rate

    def can_fall_to(self, x, w):
        return False

    def fill(self, x, dt):
        return self.rate * dt, x + self.rate * dt

    def take(self, x, w, dt):
        return x + w * dt

    def wait(self, x, w):
        return NEVER

    def bend(self, x):
        return NEVER

    def slack(self, x, w):
        return inf


class HortonDepth:
    """Horton following infiltrated depth. x is the depth on the curve (recovery sets it back)."""

    def __init__(self, f0, fc, k, recovery):
        self.f0, self.fc, self.k, self.recovery = f0, fc, k, recovery
        self.floor = fc
        self.reach = (f0 - fc) / k  # what the curve holds above its fc part, mm
        self.known = {}

    def curve(self, te):
        return self.fc * te - self.reach * expm1(-self.k * te)

    def curve_time(self, x):
        """te of x: with fc > 0, k (te - (x - A)/fc) = W0((k A/fc) exp(-k (x - A)/fc))."""
        if x not in self.known:
            self.known[x] = self.solve_curve_time(x)
        return self.known[x]

    def solve_curve_time(self, x):
        if self.fc == 0:
            # At 45 digits a spent curve reads as full; 1e-40 of it is nothing in any account.
            return -log(max(1 - x / self.reach, mpf(10) ** -40)) / self.k
        base = (x - self.reach) / self.fc
        argument = self.k * self.reach / self.fc * exp(-self.k * base)
        return base + lambertw(argument).real / self.k

    def capacity(self, x):
        return self.fc + (self.f0 - self.fc) * exp(-self.k * self.curve_time(x))

    def can_fall_to(self, x, w):
        return w > self.fc

    def time_of(self, w):
        return log((self.f0 - self.fc) / (w - self.fc)) / self.k

    def fill(self, x, dt):
        te = self.curve_time(x) + dt
        new = self.curve(te)
        self.known[new] = te
        return new - x, new

    def take(self, x, w, dt):
        if w > 0 or self.recovery == 0:
            return x + w * dt
        risen = self.f0 - (self.f0 - self.capacity(x)) * exp(-self.recovery * dt)
        return self.curve(self.time_of(risen))

    def wait(self, x, w):
        if w <= self.fc:
            return NEVER
        target = self.curve(self.time_of(w))
        return (target - x) / w, target

    def bend(self, x):
        return NEVER

    def slack(self, x, w):
        return self.time_of(w) - self.curve_time(x) if w > self.fc else inf


class HortonClock:
    """Horton following elapsed time. x is the time since the first step's start."""

    def __init__(self, f0, fc, k):
        self.f0, self.fc, self.k = f0, fc, k
        self.floor = fc

    def capacity(self, x):
        return self.fc + (self.f0 - self.fc) * exp(-self.k * x)

    def can_fall_to(self, x, w):
        return w > self.fc

    def fill(self, x, dt):
        spread = (self.f0 - self.fc) / self.k
        return self.fc * dt + spread * (exp(-self.k * x) - exp(-self.k * (x + dt))), x + dt

    def take(self, x, w, dt):
        return x + dt

    def slack(self, x, w):
        if w <= self.fc:
            return inf
        return log((self.capacity(x) - self.fc) / (w - self.fc)) / self.k

    def wait(self, x, w):
        return (self.slack(x, w), x + self.slack(x, w)) if w > self.fc else NEVER

    def bend(self, x):
        return NEVER


class GreenAmpt:
    """Green-Ampt with S = suction times deficit > 0 and K > 0, and an optional limit of storage.

    Three forms by depth: the law below the limit; the barrier's rate while that is the smaller;
    the law again. F = S (-1 - W-1(-exp(-1 - K t/S))) solves F - S ln(1 + F/S) = K t.
    """

    floor = -inf  # a barrier may hold capacity below K

    def __init__(self, K, S, limit=None, barrier=mpf(0)):
        self.K, self.S, self.barrier = K, S, barrier
        self.limit = inf if limit is None else limit

    def law(self, x):
        return inf if x == 0 else self.K * (1 + self.S / x)

    def depth_of(self, w):
        return self.K * self.S / (w - self.K) if w > self.K else inf

    def barred(self, x):
        return x >= self.limit and x < self.depth_of(self.barrier)

    def capacity(self, x):
        return self.barrier if self.barred(x) else self.law(x)

    def can_fall_to(self, x, w):
        return not self.barred(x) and w > self.K

    def form_end(self, x):
        if x < self.limit:
            return self.limit
        return self.depth_of(self.barrier) if self.barred(x) else inf

    def curve_time(self, x):
        return (x - self.S * log1p(x / self.S)) / self.K

    def depth_at(self, te):
        scaled = self.K * te / self.S
        if scaled == 0:
            return mpf(0)
        y = -1 - lambertw(-exp(-1 - scaled), -1).real
        for _ in range(2):  # near the branch point W loses half the digits; Newton restores them
            y -= (y - log1p(y) - scaled) * (1 + y) / y
        return self.S * y

    def fill(self, x, dt):
        if self.barred(x):
            return self.barrier * dt, x + self.barrier * dt
        new = self.depth_at(self.curve_time(x) + dt)
        return new - x, new

    def take(self, x, w, dt):
        return x + w * dt

    def wait(self, x, w):
        target = self.form_end(x)
        if not self.barred(x):
            target = min(target, self.depth_of(w))
        return ((target - x) / w, target) if target < inf and w > 0 else NEVER

    def bend(self, x):
        end = self.form_end(x)
        if end == inf:
            return NEVER
        if not self.barred(x):
            return self.curve_time(end) - self.curve_time(x), end
        return ((end - x) / self.barrier, end) if self.barrier > 0 else NEVER

    def slack(self, x, w):
        if self.barred(x) or w <= self.K:
            return inf
        return self.curve_time(self.depth_of(w)) - self.curve_time(x)


def snapped(x, end):
    """x, or `end` where only rounding keeps them apart."""
    return end if abs(x - end) <= mpf(10) ** -35 else x


class Dammed:
    """A constant capacity K (Green-Ampt without suction) above a limit of storage."""

    floor = -inf

    def __init__(self, K, limit, barrier):
        self.K, self.limit, self.after = K, limit, min(barrier, K)

    def capacity(self, x):
        return self.K if x < self.limit else self.after

    def can_fall_to(self, x, w):
        return False

    def fill(self, x, dt):
        depth = self.capacity(x) * dt
        return depth, snapped(x + depth, self.limit)

    def take(self, x, w, dt):
        return snapped(x + w * dt, self.limit)

    def wait(self, x, w):
        return ((self.limit - x) / w, self.limit) if x < self.limit and w > 0 else NEVER

    def bend(self, x):
        return ((self.limit - x) / self.K, self.limit) if x < self.limit else NEVER

    def slack(self, x, w):
        return inf


class Philip:
    """Philip's two terms following infiltrated depth, with sorptivity > 0."""

    def __init__(self, sorptivity, steady):
        self.Sp, self.A = sorptivity, steady
        self.floor = steady

    def root_time(self, x):
        """The square root of the curve time at which x has gone in."""
        return 2 * x / (self.Sp + sqrt(self.Sp**2 + 4 * self.A * x))

    def capacity(self, x):
        return inf if x == 0 else self.A + self.Sp / (2 * self.root_time(x))

    def can_fall_to(self, x, w):
        return w > self.A

    def depth_at(self, te):
        return self.Sp * sqrt(te) + self.A * te

    def fill(self, x, dt):
        new = self.depth_at(self.root_time(x) ** 2 + dt)
        return new - x, new

    def take(self, x, w, dt):
        return x + w * dt

    def time_of(self, w):
        return (self.Sp / (2 * (w - self.A))) ** 2

    def wait(self, x, w):
        if w <= self.A:
            return NEVER
        target = self.depth_at(self.time_of(w))
        return (target - x) / w, target

    def bend(self, x):
        return NEVER

    def slack(self, x, w):
        return self.time_of(w) - self.root_time(x) ** 2 if w > self.A else inf


def real(fraction):
    return mpf(fraction.numerator) / fraction.denominator


def make_horton(given):
    f0, fc = real(given["initial_capacity"]), real(given["final_capacity"])
    k = real(given["decay"])
    if k == 0 or f0 == fc:
        return Constant(f0)
    if given.get("follows") == "elapsed_time":
        return HortonClock(f0, fc, k)
    return HortonDepth(f0, fc, k, real(given["recovery"]) if "recovery" in given else mpf(0))


def make_green_ampt(given):
    K = real(given["effective_conductivity"])
    if "suction_deficit" in given:
        S = real(given["suction_deficit"])
    else:
        S = real(given["wetting_front_suction"] * given["moisture_deficit"])
    limit = real(given["storage_limit"]) if "storage_limit" in given else None
    barrier = real(given["barrier_rate"]) if "barrier_rate" in given else mpf(0)
    if K == 0:
        return Constant(K)
    if S == 0:
        return Constant(K) if limit is None else Dammed(K, limit, barrier)
    return GreenAmpt(K, S, limit, barrier)


def make_philip(given):
    number, time_factor = given["sorptivity"]
    sorptivity = real(number) / sqrt(real(time_factor))
    steady = real(given["steady_term"])
    return Constant(steady) if sorptivity == 0 else Philip(sorptivity, steady)


def make_law(name, given):
    """The law of a surface; a phi index is made by whoever knows its rate."""
    if name == "impervious":
        return Constant(mpf(0))
    if name == "constant_rate":
        return Constant(real(given["rate"]))
    makers = {"horton": make_horton, "green_ampt": make_green_ampt, "philip": make_philip}
    return makers[name](given)
