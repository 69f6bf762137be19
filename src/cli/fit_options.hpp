#pragma once

#include <array>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "cli/arguments.hpp"
#include "cli/run_files.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/fieldtest/readings.hpp"
#include "rainledger/report/summary.hpp"

namespace rainledger {

/// Options that every input takes.
inline constexpr std::array kFitOutputs{
    OptionRow{"csv", "FILE.csv", "readings, rates and the fitted value of each law (mm, min)"},
    OptionRow{"json", "FILE",
              "everything, for programs (mm, h, mm/h); '-' writes it to standard output\n"
              "in place of the summary"},
    OptionRow{"yaml", "FILE.yaml",
              "the 'losses:' of the best law that scenarios know, and 'draws:' with its\n"
              "covariance"},
    OptionRow{"law", "NAME", "the law of --yaml: horton, green_ampt or philip"},
    OptionRow{"chart", "FILE",
              "a picture of the test, as its ending says: .svg, .png, .pdf or .txt;\n"
              "'-' draws it as text on standard output, after the summary"},
    OptionRow{"units", "mm|in",
              "units of summary and chart: mm and mm/h (the default), or in and in/h"},
    OptionRow{"quiet", "", "no warnings and notes on standard error"},
};
/// Options that a YAML states itself.
inline constexpr std::array kFitReadings{
    OptionRow{"ring", "DIAMETERS",
              "diameter of the ring ('300 mm'), or of both ('300 mm, 600 mm'); volumes\n"
              "added need the inner one"},
    OptionRow{"design-factor", "NUMBER", "divides every rate for design (1 unless given: none)"},
};

/// All of them, as one table.
inline constexpr auto kFitOptions = [] {
    std::array<OptionRow, kFitOutputs.size() + kFitReadings.size()> all{};
    std::size_t at = 0;
    for (const OptionRow& row : kFitOutputs)
        all[at++] = row;
    for (const OptionRow& row : kFitReadings)
        all[at++] = row;
    return all;
}();

/// What `rainledger fit` was asked to do.
struct FitOptions {
    std::string input;
    std::optional<std::string> csv;
    std::optional<std::string> json;  ///< path; "-" for standard output
    std::optional<std::string> yaml;
    std::optional<FieldLaw> law;
    std::optional<std::string> chart;  ///< path; "-" for text on standard output
    DisplayUnits units = DisplayUnits::metric;
    bool quiet = false;

    std::optional<Rings> rings;           ///< sound
    std::optional<double> design_factor;  ///< >= 1

    /// The files to write, in their order.
    [[nodiscard]] std::vector<Output> outputs() const;
};

/// Reads the words after `fit`. Nothing with `problem`, one line, when they are wrong whatever the
/// input is.
[[nodiscard]] std::optional<FitOptions> read_fit_options(std::span<const std::string> given,
                                                         std::string& problem);

}  // namespace rainledger
