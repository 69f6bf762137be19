#pragma once

#include <string>
#include <vector>

#include "cli/runner.hpp"

namespace rainledger::cli_test {

/// A good test: Horton's curve with f0 120, fc 24 mm/h and k 3 1/h, read to 0.1 mm.
inline const std::string kGoodReadings =
    "time [min],infiltrated [mm]\n"
    "5,9.1\n10,16.6\n15,22.9\n20,28.2\n30,36.9\n45,46.6\n60,54.4\n80,63.4\n100,71.8\n120,79.9\n"
    "150,92.0\n180,104.0\n";

/// The same stopped before its rates have become steady.
inline const std::string kShortReadings =
    "time [min],infiltrated [mm]\n2,3.8\n4,7.4\n6,10.7\n8,13.7\n10,16.6\n";

/// A folder with tests of all kinds.
struct FitFolder {
    testing::Folder folder;
    Setting setting{folder.path()};

    FitFolder() {
        folder.write("pit.csv", kGoodReadings);
        folder.write("pit.yaml",
                     "title: Quarry Row, pit 3\nreadings: pit.csv\n"
                     "ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}\n");
        folder.write("short.csv", kShortReadings);
        folder.write("volumes.csv",
                     "time [min],volume_added [mL]\n5,640\n10,540\n20,820\n40,1200\n");
        folder.write("scenario.yaml",
                     "storm: {steps: {every: 5 min, depths: [2, 6, 1], unit: mm}}\n"
                     "surfaces: {lawn: {area: 1 ha, losses: impervious}}\n");
    }

    [[nodiscard]] Outcome fit(const std::vector<std::string>& words) const {
        return run(setting, joined({"fit"}, words));
    }
};

}  // namespace rainledger::cli_test
