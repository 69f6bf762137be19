#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "cli/read_input.hpp"
#include "cli/storm_options.hpp"
#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"
#include "rainledger/report/storm_summary.hpp"
#include "rainledger/scenario/scenario.hpp"

// What `rainledger storm` makes of its input.
namespace rainledger {

enum class InputKind { scenario, statistics, rain };

/// An input whose kind is known.
struct StormInput {
    InputKind kind = InputKind::scenario;
    std::string text;
    std::string why;  ///< "by its ending", "its columns are return periods"
};

/// Reads the input and decides what it is: by the ending .yaml or .yml a scenario; with a tip's
/// depth a record; by its rows a table of statistics; by a first line that is no row a scenario;
/// else rain. Nothing after adding to `diagnostics`.
[[nodiscard]] std::optional<StormInput> read_storm_input(const StormOptions& options,
                                                         Diagnostics& diagnostics);

/// True for CSV text whose header is that of a tip log: times alone, or with a count of tips.
[[nodiscard]] bool looks_like_tips(const std::string& text);

/// A table of statistics, with formulas where they were asked for.
struct ShownTable {
    std::string title;
    RainfallStatistics statistics;
    std::vector<ColumnFit> fits;
};

/// The events of a record.
struct ShownEvents {
    std::string title;
    GaugeRecord record;
    EventRule rule;
    RecordEvents events;
    std::vector<EventRarity> rarities;  ///< empty, or one per event
};

/// What is shown and written, and in words how the input was read.
struct StormFindings {
    std::string read_as;
    std::variant<Scenario, ShownTable, ShownEvents> found;
};

/// What became of an input: findings; or a `problem` of the command line; or, where there is
/// neither, errors that were added to the diagnostics.
struct Gathered {
    std::optional<StormFindings> findings;
    std::string problem;
};
/// A gauge record with everything that it is read and parted by.
struct OpenedRecord {
    GaugeRecord record;
    RecordSource source;
    std::optional<RainfallStatistics> statistics;
};

/// Reads the table of source.statistics_path, if there is one. False where it cannot be read, or is
/// wrong, or (`problem`, which begins with `named_by`) holds no return periods.
[[nodiscard]] bool read_statistics(OpenedRecord& read, std::string_view named_by,
                                   Diagnostics& diagnostics, std::string& problem);

/// All events of a record.
[[nodiscard]] Gathered list_events(std::string title, OpenedRecord read, std::string read_as);

[[nodiscard]] Gathered storms_of_scenario(const StormOptions& options, StormInput input,
                                          Diagnostics& diagnostics);
[[nodiscard]] Gathered storms_of_statistics(const StormOptions& options, StormInput input,
                                            Diagnostics& diagnostics);
[[nodiscard]] Gathered storms_of_rain(const StormOptions& options, StormInput input,
                                      Diagnostics& diagnostics);

/// Brings a storm to steps of --every, if it was given. What is wrong, or nothing.
[[nodiscard]] std::string take_steps(const StormOptions& options, Storm& storm);

}  // namespace rainledger
