#pragma once

#include "rainledger/rain/hyetograph_csv.hpp"
#include "scenario/yaml.hpp"

// The keys that say how a CSV file of rain is read.
namespace rainledger {

/// The layout by the keys `time`, `rain`, `unit`, `time_unit`, `kind`, `stamp`, `zone`, `missing`,
/// `gaps` of a map, where they are there. What is wrong is reported.
[[nodiscard]] CsvLayout read_csv_layout(const ClosedMap& map);

}  // namespace rainledger
