#include "rainledger/losses/philip.hpp"

#include <cmath>

namespace rainledger {
namespace {

/// Growth of u = sqrt(te) while F grows by `depth` from u: the positive root of
/// A v^2 + (Sp + 2 A u) v = depth, in the form that does not cancel.
double root_growth(double Sp, double A, double u, double depth) {
    const double b = Sp + 2.0 * A * u;
    const double divisor = b + std::sqrt(b * b + 4.0 * A * depth);
    return divisor > 0.0 ? 2.0 * depth / divisor : 0.0;
}

/// u at which the capacity falls to `rate` > A.
double root_at_rate(double Sp, double A, double rate) {
    return Sp / (2.0 * (rate - A));
}

bool never_falls_to(double A, double rate) {
    return rate <= A * (1.0 + kRateTolerance);
}

}  // namespace

double philip_capacity(double Sp, double A, double time_h) {
    return Philip{Sp, A}.capacity({std::sqrt(time_h)});
}

double philip_cumulative(double Sp, double A, double time_h) {
    return Sp * std::sqrt(time_h) + A * time_h;
}

double philip_ponding_time(double Sp, double A, double rain_mm_per_h) {
    return Philip{Sp, A}.time_below({}, rain_mm_per_h, kNever);
}

double Philip::capacity(const State& state) const {
    if (sorptivity_mm_per_sqrt_h == 0.0) return steady_term_mm_per_h;
    return sorptivity_mm_per_sqrt_h / (2.0 * state.root_te) + steady_term_mm_per_h;
}

double Philip::time_at_capacity(const State& state, double rate) const {
    if (never_falls_to(steady_term_mm_per_h, rate)) return kNever;
    const double u = root_at_rate(sorptivity_mm_per_sqrt_h, steady_term_mm_per_h, rate);
    return u <= state.root_te ? 0.0 : (u - state.root_te) * (u + state.root_te);
}

double Philip::time_below(const State& state, double supply, double /*within*/) const {
    const double Sp = sorptivity_mm_per_sqrt_h;
    const double A = steady_term_mm_per_h;
    if (never_falls_to(A, supply)) return kNever;
    const double u = root_at_rate(Sp, A, supply);
    const double v = u - state.root_te;
    return v <= 0.0 ? 0.0 : v * (Sp + A * (u + state.root_te)) / supply;
}

double Philip::advance_at_capacity(State& state, double dt) const {
    const double before = state.root_te;
    state.root_te = std::sqrt(before * before + dt);
    const double growth = dt / (state.root_te + before);  // of sqrt(te)
    return sorptivity_mm_per_sqrt_h * growth + steady_term_mm_per_h * dt;
}

void Philip::advance_below(State& state, double supply, double dt) const {
    state.root_te +=
        root_growth(sorptivity_mm_per_sqrt_h, steady_term_mm_per_h, state.root_te, supply * dt);
}

}  // namespace rainledger
