#pragma once

#include <cstddef>
#include <span>
#include <vector>

#include "rainledger/rain/hyetograph.hpp"

namespace rainledger {

/// A step as drawn: hours from the first edge, and whose values stand there.
struct DrawnStep {
    double from_h = 0.0;
    double to_h = 0.0;
    std::size_t step = 0;  ///< the step whose rates are drawn
    std::size_t last = 0;  ///< the last step that lies here, for what has come together by its end
};

/// The first `steps` steps of a hyetograph as they are drawn. Up to `most` of them each step stands
/// for itself, true to its length and rate. Of more, those that begin within the same one of `most`
/// equal parts of the time are drawn as one, at the rates of the heaviest by `weight` (one value a
/// step): finer than that a page cannot show, and no peak is lost.
[[nodiscard]] std::vector<DrawnStep> drawn_steps(const Hyetograph& rain, std::size_t steps,
                                                 std::span<const double> weight, std::size_t most);

}  // namespace rainledger
