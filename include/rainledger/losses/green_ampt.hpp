#pragma once

#include <optional>

#include "rainledger/losses/law.hpp"

// Infiltration after Green and Ampt (1911, "Studies on soil physics", J. Agric. Sci. 4), with
// ponding under unsteady rain after Mein and Larson (1973, Water Resour. Res. 9) and Chu (1978,
// Water Resour. Res. 14). The head of the ponded water is neglected.
//
//   fp = K (1 + S/F),   S = psi dtheta
//   F - F0 - S ln((S + F)/(S + F0)) = K dt          at capacity
//   fp falls to w > K at F = K S/(w - K)
//
// K effective conductivity (mm/h), psi suction head at the wetting front (mm), dtheta moisture
// deficit (-), S suction-deficit product (mm), F infiltrated depth (mm).
namespace rainledger {

// --- The textbook functions, for a soil ponded from time zero and for constant rain. ---
// K >= 0 in mm/h, S >= 0 in mm.

/// fp at infiltrated depth F >= 0, mm/h; infinite at F = 0 where K > 0 and S > 0.
[[nodiscard]] double green_ampt_capacity(double K, double S, double F);
/// F after `time_h` >= 0 of ponding from F = 0, mm.
[[nodiscard]] double green_ampt_cumulative(double K, double S, double time_h);
/// Depth infiltrated in `dt` hours at capacity, starting from F0 >= 0, mm.
[[nodiscard]] double green_ampt_growth(double K, double S, double F0, double dt);
/// Time at capacity in which F grows from F0 to F1 >= F0, h; infinite where K = 0.
[[nodiscard]] double green_ampt_time_between(double K, double S, double F0, double F1);
/// Time to ponding under constant rain, h (Mein and Larson 1973): infinite if the rain never
/// exceeds the capacity.
[[nodiscard]] double green_ampt_ponding_time(double K, double S, double rain_mm_per_h);

// --- The law. ---

/// Green and Ampt's capacity as a function of infiltrated depth. S = 0 is a constant capacity K;
/// K = 0 is no capacity. With a storage limit (pore space above a barrier or water table, mm), from
/// F = limit on the capacity is min(barrier_rate, K (1 + S/F)).
struct GreenAmpt {
    double conductivity_mm_per_h = 0.0;           ///< K >= 0
    double suction_deficit_mm = 0.0;              ///< S >= 0
    std::optional<double> storage_limit_mm = {};  ///< >= 0
    double barrier_rate_mm_per_h = 0.0;           ///< >= 0

    struct State {
        double infiltrated_mm = 0.0;  ///< F
    };

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& state) const;
    [[nodiscard]] double time_at_capacity(const State& state, double rate) const;
    [[nodiscard]] double time_below(const State& state, double supply, double within) const {
        const double K = conductivity_mm_per_h;
        const double F = state.infiltrated_mm;
        // Not ponded by the end of `within` if fp > w there: K (F + S) > w F, without a divide.
        const double F_end = F + supply * within;
        if (!storage_limit_mm && K * (F_end + suction_deficit_mm) > supply * F_end) return kNever;
        return time_below_solved(state, supply);
    }
    double advance_at_capacity(State& state, double dt) const;
    void advance_below(State& state, double supply, double dt) const {
        state.infiltrated_mm += supply * dt;
    }
    void rest(State& /*state*/, double /*dt*/) const {}

private:
    [[nodiscard]] double depth_of(const State& state) const;
    [[nodiscard]] double time_below_solved(const State& state, double supply) const;
    [[nodiscard]] double depth_where_capacity_is(double rate) const;
    [[nodiscard]] double free_depth_beyond_barrier() const;
};
static_assert(InfiltrationLaw<GreenAmpt>);

}  // namespace rainledger
