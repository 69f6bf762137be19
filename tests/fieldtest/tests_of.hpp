#pragma once

#include <optional>
#include <span>
#include <string>
#include <vector>

#include "rainledger/fieldtest/readings.hpp"
#include "test.hpp"

// Tests made of plain numbers.
namespace rainledger {

/// The test of one pit, read at `minutes`.
inline InfiltrationTest test_of(ReadingKind kind, std::span<const double> minutes,
                                std::span<const double> values, const std::string& pit = {},
                                const std::optional<Rings>& rings = {}) {
    std::vector<ReadingRow> rows;
    for (std::size_t i = 0; i < values.size(); ++i)
        rows.push_back({pit, minutes[i] / 60.0, values[i], false});
    const ReducedReadings reduced = reduce_readings(rows, kind, rings);
    REQUIRE(reduced.problems.empty());
    REQUIRE(reduced.tests.size() == 1);
    return reduced.tests.front();
}

inline InfiltrationTest test_of(ReadingKind kind, const std::vector<double>& minutes,
                                const std::vector<double>& values, const std::string& pit = {}) {
    return test_of(kind, std::span(minutes), std::span(values), pit);
}

}  // namespace rainledger
