#pragma once

#include "rainledger/losses/law.hpp"

// Philip's two-term infiltration (Philip 1957, "The theory of infiltration: 4. Sorptivity and
// algebraic infiltration equations", Soil Science 84), following infiltrated depth.
//
//   F(te)  = Sp sqrt(te) + A te,   fp(te) = Sp/(2 sqrt(te)) + A
//
// Sp sorptivity (mm/h^0.5), A steady term (mm/h), te time on the curve (h).
namespace rainledger {

// --- The textbook functions. Sp >= 0, A >= 0. ---

/// fp at `time_h` >= 0, mm/h; infinite at 0 where Sp > 0.
[[nodiscard]] double philip_capacity(double Sp, double A, double time_h);
/// F at `time_h` >= 0, mm.
[[nodiscard]] double philip_cumulative(double Sp, double A, double time_h);
/// Time to ponding under constant rain, following infiltrated depth (time condensation), h;
/// infinite if the rain never exceeds the capacity.
[[nodiscard]] double philip_ponding_time(double Sp, double A, double rain_mm_per_h);

// --- The law. ---

/// Philip's capacity as a function of infiltrated depth. Sp = 0 is a constant capacity A.
struct Philip {
    double sorptivity_mm_per_sqrt_h = 0.0;  ///< Sp >= 0
    double steady_term_mm_per_h = 0.0;      ///< A >= 0

    struct State {
        double root_te = 0.0;  ///< sqrt(te), h^0.5
    };

    [[nodiscard]] State start() const { return {}; }
    [[nodiscard]] double capacity(const State& state) const;
    [[nodiscard]] double time_at_capacity(const State& state, double rate) const;
    [[nodiscard]] double time_below(const State& state, double supply, double within) const;
    double advance_at_capacity(State& state, double dt) const;
    void advance_below(State& state, double supply, double dt) const;
    void rest(State& /*state*/, double /*dt*/) const {}
};
static_assert(InfiltrationLaw<Philip>);

}  // namespace rainledger
