#pragma once

#include <concepts>
#include <limits>

// What every infiltration law answers. One marching routine serves them all through these
// questions and knows no law by name.
namespace rainledger {

/// Relative room in which a supply counts as equal to a law's steady capacity. Intensities are
/// depth over duration and carry a few roundings; without this a rain meant to equal a constant
/// capacity would pond by the last bit.
inline constexpr double kRateTolerance = 1.0e-12;

inline constexpr double kNever = std::numeric_limits<double>::infinity();

/// An infiltration law: parameters (the object) plus a small state, with F the infiltrated depth in
/// mm, capacity fp in mm/h, times in h, supply w in mm/h.
///
/// * start()                        the state before any rain
/// * capacity(s)                    fp now; infinite where unlimited
/// * time_at_capacity(s, r)         time, infiltrating at capacity, until fp has fallen to r; 0 if
/// it
///                                  has already; kNever if it never does
/// * time_below(s, w, within)       time, taking in w below capacity, until fp has fallen to w; 0
/// if it
///                                  has already; any value above `within` if not inside that time
/// * advance_at_capacity(s, dt)     moves the state on and returns the depth infiltrated, mm
/// * advance_below(s, w, dt)        moves the state on, w dt infiltrating, fp >= w throughout
/// * rest(s, dt)                    moves the state on with no supply
///
/// fp never rises except in rest(). time_at_capacity and time_below agree on what "already" means.
template <class Law>
concept InfiltrationLaw = requires(const Law& law, typename Law::State& state,
                                   const typename Law::State& seen, double x) {
    { law.start() } -> std::same_as<typename Law::State>;
    { law.capacity(seen) } -> std::same_as<double>;
    { law.time_at_capacity(seen, x) } -> std::same_as<double>;
    { law.time_below(seen, x, x) } -> std::same_as<double>;
    { law.advance_at_capacity(state, x) } -> std::same_as<double>;
    { law.advance_below(state, x, x) } -> std::same_as<void>;
    { law.rest(state, x) } -> std::same_as<void>;
};

}  // namespace rainledger
