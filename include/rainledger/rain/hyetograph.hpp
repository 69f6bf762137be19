#pragma once

#include <cstddef>
#include <cstdint>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "rainledger/base/quantity.hpp"

// The hyetograph: rain as a row of contiguous steps of constant intensity.
namespace rainledger {

/// Step edges as they were given in elapsed time: numbers and their unit, so that text written back
/// is the text read.
struct GivenEdges {
    std::vector<double> value;  ///< steps + 1, in the given unit
    std::string unit;           ///< "s", "min", "h", ... as find_unit takes it for Dimension::time
};

/// Step edges as instants of the civil calendar.
struct StampedEdges {
    std::vector<std::int64_t> unix_ms;  ///< steps + 1; milliseconds since 1970-01-01 00:00 UTC
                                        ///< (of the clock face where has_offset is false)
    std::vector<std::int16_t> offset_minutes;  ///< steps + 1; local time minus UTC at each edge
    bool has_offset = false;                   ///< false: neither zone nor offset is known
};

/// Rain as contiguous steps. Times in h, depths in mm. Plain data; make_hyetograph and the readers
/// keep its rules: at least one step, every duration > 0, every depth >= 0 and finite.
struct Hyetograph {
    std::vector<double> edges_h;  ///< steps + 1 elapsed times, as given: the first need not be 0
    std::vector<double>
        duration_h;                ///< one per step, from the edges in the unit they were given in,
                                   ///< so that equal steps have equal durations to the last bit
    std::vector<double> depth_mm;  ///< one per step

    std::size_t own_steps = 0;    ///< steps of the storm itself; dry ones appended later come after
    double taken_as_dry_h = 0.0;  ///< total of the holes and empty cells that were taken as no rain
    std::vector<std::size_t> dry_steps;  ///< those steps, rising; no step that append_dry_time adds
    bool clock_assumed =
        false;  ///< stamps without zone or offset: the clock is taken never to change

    std::optional<GivenEdges> given;     ///< for elapsed times
    std::optional<StampedEdges> stamps;  ///< for timestamps

    [[nodiscard]] std::size_t steps() const { return depth_mm.size(); }
    [[nodiscard]] double intensity_mm_per_h(std::size_t step) const {
        return depth_mm[step] / duration_h[step];
    }
};

/// A hyetograph from its edges (steps + 1, strictly rising, in `unit`) and depths in mm. The caller
/// has checked both.
[[nodiscard]] Hyetograph make_hyetograph(std::vector<double> edges, std::string unit,
                                         std::vector<double> depth_mm);

/// A hyetograph from stamped edges and depths in mm; elapsed hours count from the first edge.
[[nodiscard]] Hyetograph make_hyetograph(StampedEdges edges, std::vector<double> depth_mm);

/// Scales every depth: an allowance on rain. `factor` >= 0.
void multiply_depths(Hyetograph& rain, double factor);

/// Appends `hours` > 0 of dry time in steps as long as the storm's last one, the very last shorter
/// where needed; a remainder below 1e-9 h is dropped. own_steps stays. Stamped edges go on in whole
/// milliseconds and keep the last edge's UTC offset. The caller bounds the number of steps.
void append_dry_time(Hyetograph& rain, double hours);

/// Depth in mm and duration in h of the storm's own steps, and its largest step intensity in mm/h.
[[nodiscard]] double total_depth_mm(const Hyetograph& rain);
[[nodiscard]] double own_duration_h(const Hyetograph& rain);
[[nodiscard]] double peak_intensity_mm_per_h(const Hyetograph& rain);

/// ISO 8601 text of edge `edge` of a stamped hyetograph, with its UTC offset where known:
/// "2026-03-04T10:05:00+01:00", "2026-03-04T09:05:00Z". Fractions of a second (three digits) are
/// written only where there are any.
[[nodiscard]] std::string iso_stamp(const StampedEdges& stamps, std::size_t edge);

/// The same rain cut at further edges (elapsed h, rising). A cut within 1e-9 h of an existing edge
/// is that edge; a cut outside the rain is none. Uncut steps stay as they are to the last bit, and
/// the parts of a step add up to it. `step_of[i]` of the result is the original step that new step
/// i lies in.
struct CutHyetograph {
    Hyetograph rain;  ///< edges, durations, depths and own_steps only
    std::vector<std::size_t> step_of;
};
[[nodiscard]] CutHyetograph cut_hyetograph(const Hyetograph& rain, std::span<const double> cuts_h);

}  // namespace rainledger
