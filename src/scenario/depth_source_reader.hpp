#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/rain/depth_duration.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "scenario/yaml.hpp"

// Where a design storm's depth is from.
namespace rainledger {

/// A depth in mm, a curve of depths by duration, or a table of statistics; and in words, as in
/// DesignOrigin.
struct DepthSource {
    std::variant<double, DepthDuration, RainfallStatistics> depth;
    std::string words;
};

/// The source under `entry`, which is one of the keys kDepthSources. A statistics file is noted in
/// `storm`. Nothing where it is wrong, and reported.
[[nodiscard]] std::optional<DepthSource> read_depth_source(const Reading& reading,
                                                           const Entry& entry, Storm& storm);

/// A table of rainfall statistics that the scenario names.
struct StatisticsFile {
    RainfallStatistics table;
    std::string name;  ///< as the scenario names it
    std::string path;  ///< as opened
};
[[nodiscard]] std::optional<StatisticsFile> read_statistics(const Reading& reading,
                                                            const Entry& entry);

}  // namespace rainledger
