"""Marches one surface through a storm, event by event, at 45 significant digits.

The rain and run-on are constant within a piece, so the depth ponded is convex in time and each
piece has a handful of events; each is solved for. Newton's method is started from the side on
which a convex function's tangents cannot overshoot the root.
"""

from mpmath import inf, mpf

from laws import make_law, real

TINY = mpf(10) ** -30  # rounding at 45 digits; two numbers closer than this are equal
ROUNDING = mpf(10) ** -38  # what a time cannot be told to, h
ACCOUNTS = ("rain", "run_on", "initial_loss", "infiltrated", "ponded", "excess")


def near(a, b):
    if inf in (a, b):
        return a == b
    return abs(a - b) <= TINY * max(abs(a), abs(b))


def soonest(span, event):
    """The shorter of two times; the span itself where only rounding keeps them apart."""
    return span if event >= span - TINY else event


def newton(level, slope_at, start):
    """The root of a convex `level`, from a start on the side its tangents point from."""
    x = start
    for _ in range(200):
        step = level(x) / slope_at(x)
        x -= step
        if abs(step) <= max(TINY * abs(x) / 1000, ROUNDING):
            return x
    raise ArithmeticError("no root found")


class March:
    """The state of a surface, its accounts per step and its instants.

    `margin` is the smallest distance, in mm, mm/h or h, by which any decision was taken (does it
    pond in this piece, does the pond drain, does it fill): below about 1e-6 the answer in double
    precision may rightly differ in kind and not only in the last digits.
    """

    def __init__(self, surface, law, steps):
        self.law, self.x = law, mpf(0)
        self.held = surface["held"]
        self.store = real(surface["storage_mm"])
        self.interception_left = real(surface["interception_mm"])
        self.initial_left = real(surface["parameters"].get("initial_loss", 0 * surface["area_m2"]))
        self.pond = mpf(0)
        self.rows = {name: [mpf(0)] * steps for name in ACCOUNTS}
        self.capacities = [None] * steps
        self.ponding, self.ponded_since = [], None
        self.runoff_start = None
        self.outflow = []
        self.drained_at, self.turns = None, set()
        self.margin = inf

    def note(self, distance):
        if abs(distance) > TINY:
            self.margin = min(self.margin, abs(distance))

    def run(self, pieces):
        for piece in pieces:
            t = piece["start"]
            while t < piece["end"]:
                t = self.advance(piece, t)
            self.rows["ponded"][piece["step"]] = self.pond
            self.capacities[piece["step"]] = self.law.capacity(self.x)
        self.note_interrupted(pieces[-1]["end"])
        if self.ponded_since is not None:
            self.ponding.append((self.ponded_since, None))
        return self

    def events(self):
        """Instants at which the surface changed its ways, not only the supply."""
        found = {t for interval in self.ponding for t in interval} | {self.runoff_start}
        return sorted((found | self.turns) - {None})

    def advance(self, piece, t):
        """One move: to the piece's end or to the next event, whichever is sooner."""
        rain, run_on = piece["rain"], piece["run_on"]
        left = piece["end"] - t
        intercepting = self.interception_left > 0 and rain > 0
        until_full = self.interception_left / rain if intercepting else inf
        w = run_on if intercepting else rain + run_on
        span = soonest(left, until_full)
        dt, taken, infiltrated, excess = self.move(w, span, t)
        if intercepting:
            taken += rain * dt
            self.interception_left -= rain * dt
            if abs(dt - until_full) <= TINY:
                self.interception_left = mpf(0)
        end = piece["end"] if dt == left else t + dt
        if dt < span:
            self.turns.add(end)
        self.book(piece, t, end, (rain * dt, run_on * dt, taken, infiltrated, excess))
        return end

    def book(self, piece, start, end, amounts):
        for name, amount in zip(("rain", "run_on", "initial_loss", "infiltrated", "excess"),
                                amounts):
            self.rows[name][piece["step"]] += amount
        self.outflow.append((start, end, amounts[4]))

    def move(self, w, span, t):
        """(time, initial loss, infiltrated, excess) of the next move, at most `span` long."""
        if self.initial_left > 0 and w > 0:
            return self.fill_initial_loss(w, span, t)
        capacity = self.law.capacity(self.x)
        if self.limited(w, capacity):
            self.mark(t, True)
            return self.move_ponded(w, capacity, span, t)
        self.mark(t, False)
        return self.move_unlimited(w, span)

    def fill_initial_loss(self, w, span, t):
        self.mark(t, False)
        until_full = self.initial_left / w
        dt = soonest(span, until_full)
        full = abs(dt - until_full) <= TINY
        self.initial_left = mpf(0) if full else self.initial_left - w * dt
        return dt, w * dt, mpf(0), mpf(0)

    def limited(self, w, capacity):
        """Whether capacity, and not the supply, decides what goes in."""
        if self.pond > 0 and not self.held:
            return True
        if w <= self.law.floor:
            self.note(w - self.law.floor)
            return False
        if near(w, capacity):
            return self.law.can_fall_to(self.x, w)
        self.note(w - capacity)
        return w > capacity

    def note_interrupted(self, t):
        """A pond that has drained at the very instant t at which ponding goes on, or the record
        ends: an end of no length, which rounding decides."""
        drained = self.drained_at is not None and abs(self.drained_at - t) <= TINY
        if self.ponded_since is not None and drained:
            self.margin = mpf(0)

    def mark(self, t, limited):
        if limited:
            self.note_interrupted(t)
        if limited and self.ponded_since is None:
            self.ponded_since = t
        if not limited and self.ponded_since is not None:
            self.ponding.append((self.ponded_since, t))
            self.ponded_since = None

    def move_unlimited(self, w, span):
        wait, target = self.law.wait(self.x, w)
        self.note(wait - span)
        dt = soonest(span, wait)
        if abs(dt - wait) <= TINY:
            self.x = target
            return dt, mpf(0), w * dt, mpf(0)
        self.x = self.law.take(self.x, w, span)
        return span, mpf(0), w * span, mpf(0)

    def move_ponded(self, w, capacity, span, t):
        rising = mpf(0) if near(w, capacity) else w - capacity
        bend, bend_x = self.law.bend(self.x)
        horizon = soonest(span, bend)
        self.note(span - bend)
        if self.pond == self.store and rising >= 0:
            dt, pond, spills = horizon, self.pond, True
            if self.runoff_start is None and (rising > 0 or self.law.can_fall_to(self.x, w)):
                self.runoff_start = t
        else:
            dt, pond, spills = *self.pond_event(w, rising, horizon), False
        depth, new = self.law.fill(self.x, dt)
        self.x = bend_x if abs(dt - bend) <= TINY else new
        if self.pond > 0 and pond == 0:
            self.drained_at = t + dt
        self.pond = pond
        return dt, mpf(0), depth, w * dt - depth if spills else mpf(0)

    def pond_event(self, w, rising, horizon):
        """(time, depth ponded then): the pond drains, fills, or lasts to the horizon."""
        def level(dt):
            return self.pond + w * dt - self.law.fill(self.x, dt)[0]

        def slope(dt):
            return w - self.law.capacity(self.law.fill(self.x, dt)[1])

        lowest = min(horizon, self.law.slack(self.x, w)) if rising < 0 else mpf(0)
        if rising < 0:
            bottom = level(lowest)
            self.note(bottom)
            if bottom <= TINY:
                dt = lowest if bottom >= -TINY else newton(level, slope, mpf(0))
                self.note(slope(dt) / 10000)
                return dt, mpf(0)
        if lowest == horizon:
            return horizon, level(horizon)
        top = level(horizon)
        self.note(self.store - top)
        if top < self.store - TINY:
            return horizon, top
        if top <= self.store + TINY:
            return horizon, self.store
        dt = newton(lambda dt: level(dt) - self.store, slope, horizon)
        self.note(slope(dt) / 10000)
        return dt, self.store


def net_supply(surface, pieces):
    """(rate, duration) of the supply after interception: what a capacity of 0 would leave."""
    bare = dict(surface, storage_mm=0 * surface["area_m2"], parameters={})
    march = March(bare, make_law("impervious", {}), pieces[-1]["step"] + 1).run(pieces)
    return [(excess / (end - start), end - start) for start, end, excess in march.outflow]


def phi_without_storage(supply, observed):
    """The rate whose total excess is `observed`: walks down the sorted rates."""
    ordered = sorted((s for s in supply if s[0] > 0), reverse=True)
    volume, duration = mpf(0), mpf(0)
    for (rate, dt), below in zip(ordered, [r for r, _ in ordered[1:]] + [mpf(0)]):
        volume, duration = volume + rate * dt, duration + dt
        if volume - below * duration >= observed:
            return max((volume - observed) / duration, mpf(0))
    return mpf(0)


def phi_by_search(excess_at, highest, observed):
    """The root of the falling, piecewise linear excess_at(phi) - observed (Illinois method)."""
    low, high = mpf(0), highest
    at_low, at_high = excess_at(low) - observed, excess_at(high) - observed
    if at_low <= TINY:
        return low
    for _ in range(300):
        phi = (low * at_high - high * at_low) / (at_high - at_low)
        value = excess_at(phi) - observed
        if abs(value) <= TINY or high - low <= TINY:
            return phi
        if value > 0:
            low, at_low, at_high = phi, value, at_high / 2
        else:
            high, at_high, at_low = phi, value, at_low / 2
    raise ArithmeticError("phi not found")


def phi_rate(surface, pieces, steps):
    """The smallest constant rate that leaves the observed excess.

    Raises ValueError where even a rate of zero leaves less.
    """
    observed = real(surface["parameters"]["observed_excess"])
    supply = net_supply(surface, pieces)
    most = sum((rate * dt for rate, dt in supply), mpf(0)) - real(surface["storage_mm"])
    if observed > max(most, mpf(0)) + TINY:
        raise ValueError("more excess observed than a rate of zero leaves")
    if surface["storage_mm"] == 0:
        return phi_without_storage(supply, observed)

    def excess_at(phi):
        at_rate = dict(surface, parameters={"rate": None})
        march = March(at_rate, make_law("impervious", {}), steps)
        march.law.rate = phi
        return sum(march.run(pieces).rows["excess"])

    return phi_by_search(excess_at, max(rate for rate, _ in supply), observed)
