#pragma once

#include <cstddef>
#include <cstdint>
#include <optional>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"

// Tips put into equal steps of time.
namespace rainledger {

/// Steps of equal length without end in either direction; step k runs from edge k to k + 1.
struct StepGrid {
    std::int64_t origin_ms = 0;
    std::int64_t every_ms = 1;

    [[nodiscard]] std::int64_t edge_ms(std::int64_t k) const { return origin_ms + k * every_ms; }
    /// The step that begins at an instant or holds it.
    [[nodiscard]] std::int64_t step_from(std::int64_t ms) const;
    /// The step that ends at an instant or holds it.
    [[nodiscard]] std::int64_t step_to(std::int64_t ms) const { return step_from(ms - 1); }
};

/// The grid for rain whose first tip is tip `first` of the log.
[[nodiscard]] StepGrid grid_at(const TipLog& log, std::size_t first, const EventSteps& steps);

/// Alike steps in a row.
struct StepRun {
    std::int64_t count = 0;
    double depth_mm = 0.0;  ///< of each
};

/// Steps from `first` to before `end` of a grid, like ones together.
struct SteppedTips {
    StepGrid grid;
    std::int64_t first = 0;
    std::int64_t end = 0;
    std::vector<StepRun> runs;
};

/// Puts tips `run.first` to `run.end` (one at least) into steps. Where `from_ms` is given none is
/// spread further back.
struct TipRange {
    std::size_t first = 0;
    std::size_t end = 0;
    std::optional<std::int64_t> from_ms;
};
[[nodiscard]] SteppedTips step_tips(const TipLog& log, const TipRange& range, const StepGrid& grid,
                                    const EventRule& rule, bool spread);

/// Widens the steps with dry ones, to run from step `first` to before `end`.
void widen(SteppedTips& stepped, std::int64_t first, std::int64_t end);

}  // namespace rainledger
