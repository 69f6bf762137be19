#pragma once

#include <array>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "cli/arguments.hpp"
#include "cli/run_files.hpp"
#include "rainledger/report/summary.hpp"

namespace rainledger {

inline constexpr std::array kLossesOptions{
    OptionRow{"ledger", "FILE.csv", "the ledger, a row for every surface and step (mm, h)"},
    OptionRow{"json", "FILE",
              "everything but the steps, for programs (mm, h, m2, m3, L/s);\n"
              "'-' writes it to standard output in place of the summary"},
    OptionRow{"chart", "FILE",
              "a picture of the losses, as its ending says: .svg, .png, .pdf or\n"
              ".txt; '-' draws it as text on standard output, after the summary"},
    OptionRow{"storm", "NAME", "the one storm that the chart shows"},
    OptionRow{"surface", "NAME", "the one surface that the chart shows"},
    OptionRow{"units", "mm|in",
              "units of summary and chart: mm, m2 or ha, m3, L/s (the default),\n"
              "or in, ac, ft3, ft3/s; the other files do not change"},
    OptionRow{"every", "DURATION",
              "rows of the ledger file at this step ('15 min') instead of the\n"
              "rain's own; totals, times and peaks do not change"},
    OptionRow{"quiet", "", "no warnings and notes on standard error"},
};

/// What `rainledger losses` was asked to do.
struct LossesOptions {
    std::string scenario;
    std::optional<std::string> ledger;  ///< path
    std::optional<std::string> json;    ///< path; "-" for standard output
    std::optional<std::string> chart;   ///< path; "-" for text on standard output
    std::optional<std::string> chart_storm;
    std::optional<std::string> chart_surface;
    std::optional<double> every_h;
    DisplayUnits units = DisplayUnits::metric;
    bool quiet = false;

    [[nodiscard]] bool json_on_stdout() const { return json == "-"; }
    /// The files to write, in their order.
    [[nodiscard]] std::vector<Output> outputs() const;
};

/// Reads the words after `losses`. Nothing with `problem`, one line, when they are wrong.
[[nodiscard]] std::optional<LossesOptions> read_losses_options(std::span<const std::string> given,
                                                               std::string& problem);

}  // namespace rainledger
