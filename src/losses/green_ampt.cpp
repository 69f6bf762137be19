#include "rainledger/losses/green_ampt.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

namespace rainledger {
namespace {

/// x - ln(1 + x) for x >= 0, without cancellation where x is small: with s = x/(2 + x),
/// ln(1 + x) = 2 atanh(s) and x - 2 s = x s, so the difference is x s - 2 s^3 (1/3 + s^2/5 + ...).
double minus_log1p(double x) {
    if (x >= 0.125) return x - std::log1p(x);
    const double s = x / (2.0 + x);
    const double q = s * s;  // below 0.0035: seven terms reach the last bit
    constexpr std::array terms{1.0 / 13.0, 1.0 / 11.0, 1.0 / 9.0, 1.0 / 7.0, 1.0 / 5.0, 1.0 / 3.0};
    double sum = 1.0 / 15.0;
    for (const double term : terms)
        sum = sum * q + term;
    return x * s - 2.0 * s * q * sum;
}

/// The relative increment r = (F - F0)/(S + F0) of growth at capacity over a dimensionless time
/// h = K dt/S from z = F0/S: the root of z r + (r - ln(1 + r)) = h.
///
/// Solving for the increment instead of F keeps every digit of a small step, and F0 = 0 is no
/// special case. r - ln(1 + r) is near r^2/2/(1 + 2r/3), which gives the start by a quadratic:
/// within r^2/18 of the root for small r, within a third for large. Householder's method of fourth
/// order follows; a step of 1e-4 leaves 1e-16. One step does for most, two or three for all; the
/// cap of 50 is never met.
double growth_increment(double z, double h) {
    const double linear = z - 2.0 / 3.0 * h;
    const double square = 2.0 / 3.0 * z + 0.5;
    const double root = std::sqrt(linear * linear + 4.0 * h * square);
    // Two forms of the same root; each is used where it does not cancel.
    double r = linear >= 0.0 ? 2.0 * h / (linear + root) : (root - linear) / (2.0 * square);
    for (int i = 0; i < 50; ++i) {
        const double inverse = 1.0 / (1.0 + r);
        const double slope = z + r * inverse;
        const double newton = (z * r + minus_log1p(r) - h) / slope;
        // Second and third derivatives, (1 + r)^-2 and -2 (1 + r)^-3, over 2 and 6 times the slope.
        const double second = 0.5 * inverse * inverse / slope;
        const double third = -2.0 / 3.0 * inverse * second;
        const double step =
            newton * (1.0 - second * newton) / (1.0 + newton * (third * newton - 2.0 * second));
        r -= step;
        if (!(std::abs(step) > 1.0e-4 * r)) break;
    }
    return r;
}

}  // namespace

double green_ampt_capacity(double K, double S, double F) {
    if (K == 0.0) return 0.0;
    if (S == 0.0) return K;
    return K * (1.0 + S / F);  // F = 0: infinite
}

double green_ampt_growth(double K, double S, double F0, double dt) {
    if (K == 0.0 || dt == 0.0) return 0.0;
    if (S == 0.0) return K * dt;
    const double z = F0 / S;
    const double h = K * dt / S;
    // S is negligible beside F0 or K dt, and the squares below would overflow.
    if (!(z < 1.0e100 && h < 1.0e100)) return K * dt;
    return growth_increment(z, h) * (S + F0);
}

double green_ampt_cumulative(double K, double S, double time_h) {
    return green_ampt_growth(K, S, 0.0, time_h);
}

double green_ampt_time_between(double K, double S, double F0, double F1) {
    if (F1 <= F0) return 0.0;
    if (K == 0.0) return kNever;
    if (S == 0.0) return (F1 - F0) / K;
    const double r = (F1 - F0) / (S + F0);
    return (F0 * r + S * minus_log1p(r)) / K;
}

double green_ampt_ponding_time(double K, double S, double rain_mm_per_h) {
    return GreenAmpt{K, S}.time_below({}, rain_mm_per_h, kNever);
}

// F, taken as the storage limit where it is short of it by a rounding: steps whose depths add up to
// the limit have reached it.
double GreenAmpt::depth_of(const State& state) const {
    const double F = state.infiltrated_mm;
    if (!storage_limit_mm || F < *storage_limit_mm * (1.0 - kRateTolerance)) return F;
    return std::max(F, *storage_limit_mm);
}

double GreenAmpt::capacity(const State& state) const {
    const double F = depth_of(state);
    const double free = green_ampt_capacity(conductivity_mm_per_h, suction_deficit_mm, F);
    if (storage_limit_mm && F >= *storage_limit_mm) return std::min(barrier_rate_mm_per_h, free);
    return free;
}

// F at which the capacity has fallen to `rate`; infinite if it never does. Where the storage limit
// drops the capacity past `rate`, that is the limit itself.
double GreenAmpt::depth_where_capacity_is(double rate) const {
    const double K = conductivity_mm_per_h;
    const double S = suction_deficit_mm;
    double depth = kNever;
    if (rate > K * (1.0 + kRateTolerance)) depth = K * S / (rate - K);
    const bool barred = storage_limit_mm && rate > barrier_rate_mm_per_h * (1.0 + kRateTolerance);
    return barred ? std::min(depth, *storage_limit_mm) : depth;
}

// F beyond which the soil, not the barrier, limits again; the storage limit itself where the
// barrier never does.
double GreenAmpt::free_depth_beyond_barrier() const {
    const double K = conductivity_mm_per_h;
    const double S = suction_deficit_mm;
    if (barrier_rate_mm_per_h <= K) return kNever;
    return std::max(*storage_limit_mm, K * S / (barrier_rate_mm_per_h - K));
}

double GreenAmpt::time_below_solved(const State& state, double supply) const {
    const double depth = depth_where_capacity_is(supply);
    const double F = depth_of(state);
    if (F >= depth) return 0.0;
    return depth == kNever ? kNever : (depth - F) / supply;
}

double GreenAmpt::time_at_capacity(const State& state, double rate) const {
    const double K = conductivity_mm_per_h;
    const double S = suction_deficit_mm;
    const double F = depth_of(state);
    const double depth = depth_where_capacity_is(rate);
    if (F >= depth) return 0.0;
    if (depth == kNever) return kNever;
    if (!storage_limit_mm || depth <= *storage_limit_mm)
        return green_ampt_time_between(K, S, F, depth);
    // Three stretches: to the limit, at the barrier's rate, and beyond it.
    const double limit = *storage_limit_mm;
    const double beyond = free_depth_beyond_barrier();
    const double barrier_start = std::max(F, limit);
    return green_ampt_time_between(K, S, F, limit) +
           std::max(0.0, beyond - barrier_start) / barrier_rate_mm_per_h +
           green_ampt_time_between(K, S, std::max(F, beyond), depth);
}

double GreenAmpt::advance_at_capacity(State& state, double dt) const {
    const double K = conductivity_mm_per_h;
    const double S = suction_deficit_mm;
    const double from = depth_of(state);
    double grown = green_ampt_growth(K, S, from, dt);
    if (storage_limit_mm && K > 0.0 && from + grown > *storage_limit_mm) {
        // The same three stretches; each takes what it can of the time.
        const double limit = *storage_limit_mm;
        const double beyond = free_depth_beyond_barrier();
        double left = dt;
        grown = 0.0;
        if (from < limit) {
            left = std::max(0.0, left - green_ampt_time_between(K, S, from, limit));
            grown = limit - from;
        }
        const double room = beyond - (from + grown);
        if (room > 0.0) {
            const double at_barrier = std::min(barrier_rate_mm_per_h * left, room);
            grown += at_barrier;
            left = at_barrier < room ? 0.0 : left - room / barrier_rate_mm_per_h;
        }
        if (left > 0.0) grown += green_ampt_growth(K, S, from + grown, left);
    }
    state.infiltrated_mm = from + grown;
    return grown;
}

}  // namespace rainledger
