#pragma once

#include <cstddef>
#include <string>
#include <vector>

#include "rainledger/rain/design_storm.hpp"

// The steps of a design storm, and what a pattern makes of them.
namespace rainledger {

/// Time in ms: a whole number of them where the time is one but for the rounding of its hours.
[[nodiscard]] double clean_ms(double hours);

/// Steps of equal length from 0; where they do not fill the duration, a shorter one at the end.
/// Edges are whole minutes to the last bit where the step is one but for the rounding of its hours.
struct StormSteps {
    std::size_t whole = 0;         ///< steps of full length; at least one
    bool has_rest = false;         ///< a shorter last step follows them
    std::vector<double> edge_min;  ///< one more than there are steps

    [[nodiscard]] std::size_t count() const { return edge_min.size() - 1; }
    [[nodiscard]] double edge_h(std::size_t edge) const { return edge_min[edge] / 60.0; }
    [[nodiscard]] double every_h() const { return edge_h(1); }
    [[nodiscard]] double duration_h() const { return edge_h(count()); }
};

/// Steps, or why they cannot be made.
struct StepsAnswer {
    StormSteps steps;
    std::string problem;  ///< empty when there are steps
    std::string hint;
};
/// Both in h; at most a million steps, none shorter than 1 ms or longer than the storm.
[[nodiscard]] StepsAnswer make_storm_steps(double duration_h, double every_h);

/// Depths per step as a pattern gives them, or why it cannot.
struct StormDepths {
    std::vector<double> depth_mm;
    std::string problem;  ///< empty when there are depths
    std::string hint;
    std::vector<std::string> warnings;
};

}  // namespace rainledger
