#pragma once

#include <string>

#include "cli/runner.hpp"

namespace rainledger::cli_test {

/// A scenario that raises no warning: its rain in a file beside it, an impervious yard.
inline const std::string kYard =
    "title: Millbrook depot\n"
    "storm:\n"
    "  hyetograph: rain.csv\n"
    "surfaces:\n"
    "  yard:\n"
    "    area: 1000 m2\n"
    "    depression_storage: 1 mm\n"
    "    losses: impervious\n";
inline const std::string kRain = "end [min],depth [mm]\n10,2\n20,6\n30,1\n";

/// The same with a curve number, which warns in so short a storm.
inline const std::string kWarning =
    "storm:\n"
    "  steps: {every: 10 min, depths: [2, 20, 30], unit: mm}\n"
    "surfaces:\n"
    "  yard:\n"
    "    area: 1000 m2\n"
    "    losses: {curve_number: {number: 90}}\n";

/// A folder with the yard's scenario and its rain.
struct Yard {
    Folder folder;
    Setting setting{folder.path()};

    Yard() {
        folder.write("yard.yaml", kYard);
        folder.write("rain.csv", kRain);
    }
};

}  // namespace rainledger::cli_test
