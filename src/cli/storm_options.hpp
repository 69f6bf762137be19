#pragma once

#include <array>
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include "cli/arguments.hpp"
#include "cli/run_files.hpp"
#include "rainledger/rain/design_storm.hpp"
#include "rainledger/report/storm_summary.hpp"

namespace rainledger {

/// Options that every input takes.
inline constexpr std::array kStormOutputs{
    OptionRow{"csv", "FILE.csv", "the steps of one storm, as a rain file for scenarios (mm)"},
    OptionRow{"json", "FILE",
              "everything, for programs (mm, h, mm/h, yr); '-' writes it to standard\n"
              "output in place of the summary"},
    OptionRow{"chart", "FILE",
              "a picture of the rain, as its ending says: .svg, .png, .pdf or .txt;\n"
              "'-' draws it as text on standard output, after the summary"},
    OptionRow{"units", "mm|in",
              "units of summary and chart: mm and mm/h (the default), or in and in/h"},
    OptionRow{"every", "DURATION",
              "steps of this length ('5 min'): of a design, of tips (5 min if not\n"
              "given), or in place of the steps that the rain has"},
    OptionRow{"quiet", "", "no warnings and notes on standard error"},
};
inline constexpr std::array kStormScenario{
    OptionRow{"storm", "NAME", "the one storm of the scenario to show and write"},
};
inline constexpr std::array kStormDesign{
    OptionRow{"duration", "DURATION", "how long the design storm lasts ('2 h')"},
    OptionRow{"return-period", "YEARS", "how rare it is ('10 yr'): picks the column of the table"},
    OptionRow{"pattern", "NAME", "its shape: alternating_blocks unless given; see below"},
    OptionRow{"peak-at", "SHARE",
              "where the peak lies, as a share of the duration (0.5 unless given)"},
    OptionRow{"curve", "NAME", "the curve of the pattern mass_curve: nrcs_II, huff_1, ..."},
    OptionRow{"fit-formula", "", "fit i = a / (t^m + b)^n to every column, with all residuals"},
};
inline constexpr std::array kStormRecord{
    OptionRow{"tip", "DEPTH", "the record is a tip log, a row per tip of this depth ('0.2 mm')"},
    OptionRow{"spread-tips", "",
              "spread a tip's depth since the tip before it, instead of putting it\n"
              "in the step in which it came"},
    OptionRow{"zone", "NAME", "the zone of stamps without UTC offset ('Europe/Madrid')"},
    OptionRow{"dry-spell", "DURATION", "what parts two events: at least so long (6 h) ..."},
    OptionRow{"threshold", "DEPTH", "... with less rain than this (0 mm: none at all)"},
    OptionRow{"statistics", "FILE.csv", "a table of statistics that says how rare each event was"},
    OptionRow{"event", "NUMBER", "cut out one event: its number in the list, or 'largest'"},
};

/// These go with a record, and with a scenario's storm out of one.
inline constexpr std::array kStormEvents{
    OptionRow{"events", "", "list the events of the record"},
    OptionRow{"sort", "ORDER",
              "order of the list: time (the default), depth, peak_5, peak_15,\n"
              "peak_30, peak_60 or rarity"},
};

/// All of them, as one table.
inline constexpr auto kStormOptions = [] {
    std::array<OptionRow, kStormOutputs.size() + kStormScenario.size() + kStormDesign.size() +
                              kStormRecord.size() + kStormEvents.size()>
        all{};
    std::size_t at = 0;
    const auto add = [&](std::span<const OptionRow> rows) {
        for (const OptionRow& row : rows)
            all[at++] = row;
    };
    add(kStormOutputs);
    add(kStormScenario);
    add(kStormDesign);
    add(kStormRecord);
    add(kStormEvents);
    return all;
}();

/// What `rainledger storm` was asked to do.
struct StormOptions {
    std::string input;
    std::optional<std::string> csv;
    std::optional<std::string> json;   ///< path; "-" for standard output
    std::optional<std::string> chart;  ///< path; "-" for text on standard output
    DisplayUnits units = DisplayUnits::metric;
    std::optional<double> every_h;
    bool quiet = false;

    std::optional<std::string> storm;

    std::optional<double> duration_h;
    std::optional<double> return_period_yr;
    std::optional<StormPattern> pattern;
    std::optional<double> peak_at;
    std::optional<std::string> curve;
    bool fit_formula = false;

    std::optional<double> tip_mm;
    bool spread_tips = false;
    std::optional<std::string> zone;
    std::optional<double> dry_spell_h;
    std::optional<double> threshold_mm;
    bool events = false;
    std::optional<EventOrder> sort;
    std::optional<std::string> statistics;  ///< path
    std::optional<std::size_t> event;       ///< number from 1; 0 is the largest

    std::vector<std::string> given;  ///< names of the options on the command line, in their order
                                     ///< of the table

    [[nodiscard]] bool has(std::string_view option) const;
    /// The first of the rows' options that was given, or nothing.
    [[nodiscard]] std::optional<std::string> first_of(std::span<const OptionRow> rows) const;
    /// The files to write, in their order.
    [[nodiscard]] std::vector<Output> outputs() const;
};

/// Reads the words after `storm`. Nothing with `problem`, one line, when they are wrong whatever
/// the input is.
[[nodiscard]] std::optional<StormOptions> read_storm_options(std::span<const std::string> given,
                                                             std::string& problem);

}  // namespace rainledger
