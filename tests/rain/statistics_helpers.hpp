#pragma once

#include <string>
#include <utility>

#include "rainledger/rain/rainfall_statistics.hpp"
#include "test.hpp"

namespace rainledger {

/// Everything that reading a table reports, as people see it. Checks that there is a table exactly
/// when nothing is an error.
inline std::string table_problems(std::string text) {
    Diagnostics diagnostics;
    const auto table = read_rainfall_statistics_csv("county.csv", std::move(text), diagnostics);
    CHECK(table.has_value() != diagnostics.has_errors());
    std::string out;
    for (const Diagnostic& diagnostic : diagnostics.list())
        out += render(diagnostic);
    return out;
}

/// The table of a text in which nothing is to be reported.
inline RainfallStatistics read_table(std::string text) {
    Diagnostics diagnostics;
    const auto table = read_rainfall_statistics_csv("county.csv", std::move(text), diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        UNSCOPED_INFO(render(diagnostic));
    REQUIRE(diagnostics.list().empty());
    REQUIRE(table.has_value());
    return *table;
}

/// An invented county table: depths in mm.
inline const std::string kCountyTable =
    "# Invented depths by duration.\n"
    "duration,2 yr [mm],5 yr [mm],10 yr [mm],25 yr [mm],50 yr [mm],100 yr [mm]\n"
    "5 min,8.2,10.8,12.5,14.9,16.8,18.6\n"
    "10 min,12.5,16.3,19.0,22.6,25.5,28.3\n"
    "15 min,15.5,20.2,23.5,28.0,31.5,35.0\n"
    "30 min,21.4,27.9,32.5,38.7,43.6,48.4\n"
    "1 h,27.1,35.3,41.0,48.8,54.9,61.1\n"
    "2 h,31.7,41.3,48.0,57.1,64.3,71.5\n"
    "3 h,34.3,44.7,52.0,61.9,69.7,77.5\n"
    "6 h,40.9,53.3,62.0,73.8,83.1,92.4\n"
    "12 h,48.8,63.6,74.0,88.1,99.2,110.3\n"
    "24 h,58.1,75.7,88.0,104.7,117.9,131.1\n";

}  // namespace rainledger
