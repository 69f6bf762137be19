#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

// Readings of an infiltration test, reduced to cumulative depths, interval depths and rates.
//
// Areas and depths follow from the rings as in common practice (and in ASTM D3385, "Standard test
// method for infiltration rate of soils in field using double-ring infiltrometer", from memory):
// the inner ring counts; the outer one only keeps its flow vertical.
namespace rainledger {

/// What was read.
enum class ReadingKind {
    infiltrated,   ///< cumulative depth since the start, mm
    drop,          ///< fall of the water since the reading before, mm
    volume_added,  ///< water added since the reading before to hold the level, m3
    water_level,   ///< height of the water over any fixed mark, mm; refills are marked
};

/// The kind as the readings' column is called: "infiltrated", "drop", ...
[[nodiscard]] std::string_view reading_kind_name(ReadingKind kind);

/// Drops and volumes are read apart, so that their errors add up along the cumulative depth; the
/// other kinds are read against the start, and each depth has an error of its own.
[[nodiscard]] constexpr bool errors_add_up(ReadingKind kind) {
    return kind == ReadingKind::drop || kind == ReadingKind::volume_added;
}

/// One row as read.
struct ReadingRow {
    std::string pit;      ///< name of the pit; the same on all rows where there is one pit
    double time_h = 0.0;  ///< since the pit's start, >= 0
    double value = 0.0;   ///< mm, or m3 for volumes
    bool refill = false;  ///< water_level only: the level just after filling up
};

/// The rings. A single ring has no outer diameter.
struct Rings {
    double inner_diameter_mm = 0.0;                ///< > 0
    std::optional<double> outer_diameter_mm = {};  ///< > inner
};
/// Area of the inner ring, m2.
[[nodiscard]] double inner_area_m2(const Rings& rings);
/// Area between the rings, m2; 0 for a single ring.
[[nodiscard]] double annulus_area_m2(const Rings& rings);
/// Empty, or what is wrong with the rings.
[[nodiscard]] std::string rings_problem(const Rings& rings);

/// One reduced reading: an interval and what stands at its end.
struct TestReading {
    std::size_t row = 0;  ///< index among the rows given
    double start_h = 0.0;
    double end_h = 0.0;
    double middle_h = 0.0;
    double interval_mm = 0.0;    ///< infiltrated in the interval
    double depth_mm = 0.0;       ///< infiltrated from `from_h` to the end
    double rate_mm_per_h = 0.0;  ///< mean over the interval
};

/// One pit's test.
struct InfiltrationTest {
    std::string pit;
    ReadingKind kind = ReadingKind::infiltrated;
    double from_h = 0.0;  ///< depths count from here; times always from the start
    std::vector<TestReading> readings;
};

/// Which cell of a row a problem lies in.
enum class ReadingCell { time, value, refill };

struct ReadingProblem {
    std::size_t row = 0;
    ReadingCell cell = ReadingCell::value;
    std::string message;  ///< what is wrong, one line, no full stop
    std::string hint;     ///< what to write instead; may be empty
};

/// The tests in order of first appearance, or what is wrong with the rows, every problem found.
struct ReducedReadings {
    std::vector<InfiltrationTest> tests;  ///< empty where there is a problem
    std::vector<ReadingProblem> problems;
};

/// Reduces the rows of one or more pits, which may alternate.
///
/// Depths start from 0 at time 0. `infiltrated` may have a row at time 0, of 0 mm; `drop` and
/// `volume_added` too. `water_level` begins with the level at time 0; a refill is a marked row of
/// the same time as the row before it, with the level just after filling.
/// `volume_added` needs `rings`.
[[nodiscard]] ReducedReadings reduce_readings(std::span<const ReadingRow> rows, ReadingKind kind,
                                              const std::optional<Rings>& rings);

/// The test without the intervals that begin before `ignored_h`; depths count from there on.
/// Nothing is left where the test is no longer than that.
[[nodiscard]] InfiltrationTest without_first(const InfiltrationTest& test, double ignored_h);

}  // namespace rainledger
