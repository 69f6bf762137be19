#pragma once

#include <cstddef>
#include <vector>

// Run-on: what one surface hands another, as rates held constant over the pieces of each step.
namespace rainledger {

/// A piece of a step: until `end_h` (from the step's start) the rate holds, mm/h.
struct RatePiece {
    double end_h = 0.0;
    double rate_mm_per_h = 0.0;
};

/// Rates through a storm, piece by piece. The pieces of a step are those from first[step] to
/// first[step + 1]; the last of them ends with the step.
struct RateSeries {
    std::vector<std::size_t> first{0};  ///< steps + 1
    std::vector<RatePiece> pieces;

    [[nodiscard]] bool empty() const { return pieces.empty(); }

    /// Adds a piece to the step being written; one of the same rate as the last is joined to it.
    void add(double end_h, double rate_mm_per_h) {
        if (pieces.size() > first.back() && pieces.back().rate_mm_per_h == rate_mm_per_h) {
            pieces.back().end_h = end_h;
        } else {
            pieces.push_back({end_h, rate_mm_per_h});
        }
    }
    void end_step(double duration_h) {
        if (pieces.size() == first.back()) pieces.push_back({duration_h, 0.0});
        pieces.back().end_h = duration_h;
        first.push_back(pieces.size());
    }
};

/// Adds `given` times `factor` to `sum`; both cover the same steps, or `sum` is empty.
void add_scaled(RateSeries& sum, const RateSeries& given, double factor);

}  // namespace rainledger
