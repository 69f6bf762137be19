#pragma once

#include <array>
#include <cstddef>
#include <stdexcept>
#include <string>
#include <string_view>

#include "published/check_file.hpp"
#include "rainledger/base/whole_file.hpp"

namespace rainledger::published {

/// A file of checks and what it must hold, so that none vanishes unseen.
struct ListedFile {
    std::string_view name;
    std::size_t checks;
    std::size_t values;  ///< printed numbers over all its checks
};

inline constexpr std::array kListedFiles{
    ListedFile{"green_ampt.yaml", 24, 49},          ListedFile{"green_ampt_storms.yaml", 28, 134},
    ListedFile{"green_ampt_ratios.yaml", 12, 56},   ListedFile{"horton.yaml", 16, 38},
    ListedFile{"horton_storms.yaml", 15, 23},       ListedFile{"philip.yaml", 3, 4},
    ListedFile{"constant_rates.yaml", 25, 39},      ListedFile{"curve_number.yaml", 27, 70},
    ListedFile{"runoff_table.yaml", 22, 286},       ListedFile{"abstraction_ratio.yaml", 23, 61},
    ListedFile{"antecedent.yaml", 12, 188},         ListedFile{"design_storms.yaml", 32, 288},
    ListedFile{"rainfall_statistics.yaml", 16, 48}, ListedFile{"soil_tables.yaml", 29, 231},
    ListedFile{"pedotransfer.yaml", 15, 177},       ListedFile{"cover_numbers.yaml", 66, 411},
    ListedFile{"soil_groups.yaml", 20, 116},        ListedFile{"horton_values.yaml", 25, 123},
    ListedFile{"storage_values.yaml", 25, 73},      ListedFile{"field_tests.yaml", 24, 26},
};

/// The folder of the tests and of the documents, set by the build.
inline constexpr std::string_view kPublishedFolder = RAINLEDGER_SOURCE_FOLDER "/tests/published/";
inline constexpr std::string_view kDocumentFolder = RAINLEDGER_SOURCE_FOLDER "/docs/";

/// The text of a file of the tree; throws std::runtime_error if it cannot be read.
[[nodiscard]] inline std::string file_text(const std::string& path) {
    std::string problem;
    const auto text = read_whole_file(path, problem);
    if (!text) throw std::runtime_error(path + ": " + problem);
    return *text;
}

[[nodiscard]] inline CheckFile load(std::string_view name) {
    return read_check_file(std::string(name),
                           file_text(std::string(kPublishedFolder) + std::string(name)));
}

[[nodiscard]] inline std::size_t value_count(const CheckFile& file) {
    std::size_t count = 0;
    for (const Check& check : file.checks)
        count += check.expected.numbers.size();
    return count;
}

}  // namespace rainledger::published
