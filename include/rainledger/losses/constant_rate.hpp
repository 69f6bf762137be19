#pragma once

#include "rainledger/losses/law.hpp"

// Constant capacities: the constant rate (with its optional initial loss the initial-and-uniform
// loss of common practice), and the impervious surface, whose capacity is zero.
namespace rainledger {

/// A constant infiltration capacity, mm/h >= 0, acting once an initial loss (mm >= 0) is filled.
/// The march fills the initial loss; the law itself is the rate.
struct ConstantRate {
    double rate_mm_per_h = 0.0;
    double initial_loss_mm = 0.0;

    struct State {};

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& /*state*/) const { return rate_mm_per_h; }
    [[nodiscard]] double time_at_capacity(const State& /*state*/, double rate) const {
        return rate > rate_mm_per_h * (1.0 + kRateTolerance) ? 0.0 : kNever;
    }
    [[nodiscard]] double time_below(const State& state, double supply, double /*within*/) const {
        return time_at_capacity(state, supply);
    }
    double advance_at_capacity(State& /*state*/, double dt) const { return rate_mm_per_h * dt; }
    void advance_below(State& /*state*/, double /*supply*/, double /*dt*/) const {}
    void rest(State& /*state*/, double /*dt*/) const {}
};
static_assert(InfiltrationLaw<ConstantRate>);

/// No infiltration at all. Nobody calls water on it ponding: it reports no ponded intervals.
struct Impervious {
    struct State {};

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& /*state*/) const { return 0.0; }
    [[nodiscard]] double time_at_capacity(const State& /*state*/, double rate) const {
        return rate > 0.0 ? 0.0 : kNever;
    }
    [[nodiscard]] double time_below(const State& state, double supply, double /*within*/) const {
        return time_at_capacity(state, supply);
    }
    double advance_at_capacity(State& /*state*/, double /*dt*/) const { return 0.0; }
    void advance_below(State& /*state*/, double /*supply*/, double /*dt*/) const {}
    void rest(State& /*state*/, double /*dt*/) const {}
};
static_assert(InfiltrationLaw<Impervious>);

/// The phi index: the smallest constant rate at which the surface's total excess is the observed
/// one (mm >= 0). It is matched by marching, and then acts as a ConstantRate.
struct PhiIndex {
    double observed_excess_mm = 0.0;
};

}  // namespace rainledger
