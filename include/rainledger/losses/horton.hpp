#pragma once

#include <cmath>

#include "rainledger/losses/law.hpp"

// Horton's infiltration capacity (Horton 1933, "The role of infiltration in the hydrologic cycle",
// Trans. AGU 14; 1940, "An approach toward a physical interpretation of infiltration-capacity",
// Soil Sci. Soc. Am. Proc. 5), in two readings: following infiltrated depth, and following elapsed
// time.
//
//   fp(te) = fc + (f0 - fc) exp(-k te)
//   F(te)  = fc te + (f0 - fc)/k (1 - exp(-k te))
//
// f0 initial capacity, fc final capacity (mm/h), k decay (1/h), te time on the curve (h).
namespace rainledger {

/// Decays below this fall by nothing in any storm, and (f0 - fc)/k would overflow: they count as 0.
inline constexpr double kSlowestDecay = 1.0e-200;  // 1/h

/// Parameters of Horton's curve. f0 >= fc >= 0, k >= 0, all finite. k = 0 or f0 = fc is a constant
/// capacity f0.
struct HortonCurve {
    double initial_capacity_mm_per_h = 0.0;  ///< f0
    double final_capacity_mm_per_h = 0.0;    ///< fc
    double decay_per_h = 0.0;                ///< k
};

// --- The textbook functions, for a soil ponded from time zero and for constant rain. ---

/// fp at `time_h` >= 0 on the curve, mm/h.
[[nodiscard]] double horton_capacity(const HortonCurve& curve, double time_h);
/// F at `time_h` >= 0 on the curve, mm.
[[nodiscard]] double horton_cumulative(const HortonCurve& curve, double time_h);
/// Time on the curve at which F is `depth_mm` >= 0, h. Infinite if F never reaches it (fc = 0 caps
/// F at f0/k).
[[nodiscard]] double horton_time_at_depth(const HortonCurve& curve, double depth_mm);
/// Time to ponding under constant rain, following infiltrated depth, h: 0 if the rain is at least
/// f0, infinite if it never exceeds the capacity.
[[nodiscard]] double horton_ponding_time(const HortonCurve& curve, double rain_mm_per_h);

// --- The law following infiltrated depth. ---

/// Horton's capacity as a function of infiltrated depth: te is the time at which a continuously
/// ponded soil would have taken in the same depth (the default reading). With recovery > 0 (1/h)
/// the capacity climbs back while the soil rests: f0 - fp shrinks by exp(-recovery dt).
struct Horton {
    HortonCurve curve;
    double recovery_per_h = 0.0;

    /// Where the soil stands: E = exp(-k te) as last solved, and the depth taken in since below
    /// capacity, not yet turned into te. Solving waits until the capacity could matter.
    struct State {
        double e = 1.0;           ///< exp(-k te)
        double pending_mm = 0.0;  ///< depth infiltrated since e was solved
        /// exp(-k dt) - 1 of the last time spent at capacity, and that time: equal steps share it.
        double last_dt = 0.0;
        double last_change = 0.0;
    };

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& state) const;
    [[nodiscard]] double time_at_capacity(const State& state, double rate) const;
    [[nodiscard]] double time_below(const State& state, double supply, double within) const {
        // |dfp/dF| = k (fp - fc)/fp <= k bounds the capacity from below without solving for te.
        const double floor =
            at_e(state.e) - curve.decay_per_h * (state.pending_mm + supply * within);
        return floor > supply ? kNever : time_below_solved(state, supply);
    }
    double advance_at_capacity(State& state, double dt) const;
    void advance_below(State& state, double supply, double dt) const {
        state.pending_mm += supply * dt;
    }
    void rest(State& state, double dt) const {
        if (recovery_per_h > 0.0) recover(state, dt);
    }

private:
    [[nodiscard]] double drop() const {  // f0 - fc
        return curve.initial_capacity_mm_per_h - curve.final_capacity_mm_per_h;
    }
    [[nodiscard]] bool falls() const { return curve.decay_per_h > kSlowestDecay && drop() > 0.0; }
    [[nodiscard]] double at_e(double e) const { return curve.final_capacity_mm_per_h + drop() * e; }
    [[nodiscard]] double time_below_solved(const State& state, double supply) const;
    [[nodiscard]] double solved_e(const State& state) const;
    void recover(State& state, double dt) const;
};
static_assert(InfiltrationLaw<Horton>);

// --- The law following elapsed time. ---

/// Horton's capacity as a function of the time since the first step began, rain or not. It spends
/// capacity while the rain is too light to use it: kept because hand calculations do so, never the
/// default.
struct HortonElapsed {
    HortonCurve curve;

    struct State {
        double clock_h = 0.0;  ///< since the first step's start
    };

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& state) const;
    [[nodiscard]] double time_at_capacity(const State& state, double rate) const;
    [[nodiscard]] double time_below(const State& state, double supply, double /*within*/) const {
        return time_at_capacity(state, supply);
    }
    double advance_at_capacity(State& state, double dt) const;
    void advance_below(State& state, double /*supply*/, double dt) const { state.clock_h += dt; }
    void rest(State& state, double dt) const { state.clock_h += dt; }
};
static_assert(InfiltrationLaw<HortonElapsed>);

}  // namespace rainledger
