#pragma once

#include <string>
#include <vector>

#include "cli/runner.hpp"
#include "test.hpp"

namespace rainledger::cli_test {

/// A table of invented statistics.
inline const std::string kTable =
    "duration,2 yr [mm],10 yr [mm],100 yr [mm]\n"
    "5 min,8.2,12.5,18.6\n"
    "15 min,15.5,23.5,35.0\n"
    "1 h,27.1,41.0,61.1\n"
    "2 h,31.7,48.0,71.5\n";

/// Tips of two events, 20 hours apart.
inline const std::string kLogger =
    "time\n"
    "2031-06-14T13:46:07Z\n"
    "2031-06-14T13:47:31Z\n"
    "2031-06-14T13:52:10Z\n"
    "2031-06-15T10:01:59Z\n"
    "2031-06-15T10:03:00Z\n";

/// Ten-minute data with a storm in the first and one in the second day.
inline const std::string kGauge =
    "start,end,depth [mm]\n"
    "2031-06-14T13:00:00Z,2031-06-14T13:10:00Z,2\n"
    "2031-06-14T13:10:00Z,2031-06-14T13:20:00Z,6\n"
    "2031-06-14T13:20:00Z,2031-06-14T13:30:00Z,1\n"
    "2031-06-15T13:00:00Z,2031-06-15T13:10:00Z,3\n";

/// Two storms, neither with surfaces.
inline const std::string kTwoStorms =
    "title: Quarry Row\n"
    "storms:\n"
    "  short: {steps: {every: 5 min, depths: [2, 6, 1], unit: mm}}\n"
    "  long: {steps: {every: 10 min, depths: [2, 6, 1], unit: mm}}\n";

/// A folder with all of them.
struct RainFolder {
    Folder folder;
    Setting setting{folder.path()};

    RainFolder() {
        folder.write("county.csv", kTable);
        folder.write("logger.csv", kLogger);
        folder.write("gauge.csv", kGauge);
        folder.write("two.yaml", kTwoStorms);
        folder.write("rain.csv", "end [min],depth [mm]\n10,2\n20,6\n30,1\n");
    }

    [[nodiscard]] Outcome storm(const std::vector<std::string>& words) const {
        return run(setting, joined({"storm"}, words));
    }
};

/// What a run with a wrong command line says of it; it must print and write nothing else.
inline std::string complaint(const RainFolder& rain, const std::vector<std::string>& words) {
    const std::vector<std::string> before = rain.folder.names();
    const Outcome outcome = rain.storm(words);
    CHECK(outcome.status == 2);
    CHECK(outcome.out.empty());
    CHECK(rain.folder.names() == before);
    const std::string lead = "rainledger storm: ";
    const std::string end = "\nSee 'rainledger storm --help'.\n";
    REQUIRE(outcome.err.starts_with(lead));
    REQUIRE(outcome.err.ends_with(end));
    return outcome.err.substr(lead.size(), outcome.err.size() - lead.size() - end.size());
}

}  // namespace rainledger::cli_test
