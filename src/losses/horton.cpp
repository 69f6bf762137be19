#include "rainledger/losses/horton.hpp"

#include <algorithm>
#include <limits>

namespace rainledger {
namespace {

/// x such that c x + a (1 - exp(-x)) = b, for a, b > 0 and c >= 0 with b < a where c = 0.
///
/// The left side rises and is concave, so Newton's method started left of the root climbs to it and
/// never passes it; the stop is the first step that no longer moves x by a rounding. At most about
/// one iteration per unit of x while the exponential rules, then quadratic: the cap of 800 lies
/// beyond the largest x (745) at which exp(-x) is not zero.
double solve_curve_time(double c, double a, double b) {
    if (c == 0.0) return -std::log1p(-b / a);
    double x = std::max(b / (c + a), (b - a) / c);
    for (int i = 0; i < 800; ++i) {
        const double decay = std::exp(-x);
        const double step = (b - c * x + a * std::expm1(-x)) / (c + a * decay);
        if (!(step > 2.0 * std::numeric_limits<double>::epsilon() * x)) break;
        x += step;
    }
    return x;
}

double drop_of(const HortonCurve& curve) {
    return curve.initial_capacity_mm_per_h - curve.final_capacity_mm_per_h;
}

bool is_constant(const HortonCurve& curve) {
    return curve.decay_per_h <= kSlowestDecay || drop_of(curve) == 0.0;
}

/// Depth between two points E0 >= E1 of the curve, E = exp(-k te).
double depth_between(const HortonCurve& curve, double e0, double e1) {
    return (curve.final_capacity_mm_per_h * std::log(e0 / e1) + drop_of(curve) * (e0 - e1)) /
           curve.decay_per_h;
}

/// E at which a falling capacity reaches `rate` > fc.
double e_at_rate(const HortonCurve& curve, double rate) {
    return (rate - curve.final_capacity_mm_per_h) / drop_of(curve);
}

/// True if the falling capacity tends to fc without ever reaching `rate`.
bool never_falls_to(const HortonCurve& curve, double rate) {
    return rate <= curve.final_capacity_mm_per_h * (1.0 + kRateTolerance);
}

double constant_time(double capacity, double rate) {
    return rate > capacity * (1.0 + kRateTolerance) ? 0.0 : kNever;
}

}  // namespace

double horton_capacity(const HortonCurve& curve, double time_h) {
    return curve.final_capacity_mm_per_h + drop_of(curve) * std::exp(-curve.decay_per_h * time_h);
}

double horton_cumulative(const HortonCurve& curve, double time_h) {
    if (is_constant(curve)) return curve.initial_capacity_mm_per_h * time_h;
    return curve.final_capacity_mm_per_h * time_h -
           drop_of(curve) / curve.decay_per_h * std::expm1(-curve.decay_per_h * time_h);
}

double horton_time_at_depth(const HortonCurve& curve, double depth_mm) {
    if (depth_mm <= 0.0) return 0.0;
    if (is_constant(curve)) return depth_mm / curve.initial_capacity_mm_per_h;
    const double k = curve.decay_per_h;
    const double c = curve.final_capacity_mm_per_h / k;
    const double a = drop_of(curve) / k;
    if (c == 0.0 && depth_mm >= a) return kNever;
    return solve_curve_time(c, a, depth_mm) / k;
}

double horton_ponding_time(const HortonCurve& curve, double rain_mm_per_h) {
    return Horton{curve}.time_below({}, rain_mm_per_h, kNever);
}

// E where the soil stands now: te moves from the last solved E until the pending depth is taken in.
double Horton::solved_e(const State& state) const {
    if (state.pending_mm == 0.0 || !falls()) return state.e;
    const double k = curve.decay_per_h;
    const double c = curve.final_capacity_mm_per_h / k;
    const double a = drop() / k * state.e;
    if (c == 0.0) return std::max(0.0, state.e - state.pending_mm * k / drop());  // rounding only
    if (a == 0.0) return 0.0;
    return state.e * std::exp(-solve_curve_time(c, a, state.pending_mm));
}

double Horton::capacity(const State& state) const {
    return at_e(solved_e(state));
}

double Horton::time_at_capacity(const State& state, double rate) const {
    if (!falls()) return constant_time(at_e(1.0), rate);
    if (never_falls_to(curve, rate)) return kNever;
    const double now = solved_e(state);
    const double then = e_at_rate(curve, rate);
    return then >= now ? 0.0 : std::log(now / then) / curve.decay_per_h;
}

double Horton::time_below_solved(const State& state, double supply) const {
    if (!falls()) return constant_time(at_e(1.0), supply);
    if (never_falls_to(curve, supply)) return kNever;
    const double then = e_at_rate(curve, supply);
    if (then >= state.e) return 0.0;
    const double room = depth_between(curve, state.e, then) - state.pending_mm;
    return std::max(0.0, room / supply);
}

double Horton::advance_at_capacity(State& state, double dt) const {
    const double e = solved_e(state);
    state.e = e;
    state.pending_mm = 0.0;
    if (!falls()) return at_e(e) * dt;
    const double x = curve.decay_per_h * dt;
    if (dt != state.last_dt) {
        state.last_dt = dt;
        state.last_change = std::expm1(-x);
    }
    const double change = state.last_change;
    // 1 + expm1 keeps its digits while x is small and saves the second exponential.
    state.e = x < 0.5 ? e + e * change : e * std::exp(-x);
    return curve.final_capacity_mm_per_h * dt - drop() / curve.decay_per_h * e * change;
}

// f0 - fp shrinks by exp(-recovery dt), so 1 - E does.
void Horton::recover(State& state, double dt) const {
    const double e = solved_e(state);
    state.e = 1.0 - (1.0 - e) * std::exp(-recovery_per_h * dt);
    state.pending_mm = 0.0;
}

double HortonElapsed::capacity(const State& state) const {
    return horton_capacity(curve, state.clock_h);
}

double HortonElapsed::time_at_capacity(const State& state, double rate) const {
    if (is_constant(curve)) return constant_time(curve.initial_capacity_mm_per_h, rate);
    if (never_falls_to(curve, rate)) return kNever;
    return std::max(0.0, -std::log(e_at_rate(curve, rate)) / curve.decay_per_h - state.clock_h);
}

double HortonElapsed::advance_at_capacity(State& state, double dt) const {
    const double from = state.clock_h;
    state.clock_h += dt;
    if (is_constant(curve)) return curve.initial_capacity_mm_per_h * dt;
    const double k = curve.decay_per_h;
    return curve.final_capacity_mm_per_h * dt -
           drop_of(curve) / k * std::exp(-k * from) * std::expm1(-k * dt);
}

}  // namespace rainledger
