#include <cstddef>
#include <string>
#include <string_view>

#include "cli/fit_options.hpp"
#include "cli/help.hpp"
#include "cli/help_parts.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kTextColumn = 26;

constexpr std::string_view kTop =
    R"(rainledger fit: infiltration laws fitted to a field test; a summary on standard output.

Usage:
  rainledger fit TEST.yaml [options]        a field test
  rainledger fit READINGS.csv [options]     its readings alone, all laws fitted
      [--ring '300 mm, 600 mm'] [--design-factor NUMBER]

)";

constexpr std::string_view kShort =
    R"(  --csv FILE.csv          readings, rates and the fitted value of each law
  --json FILE             everything, for programs; '-' for standard output
  --yaml FILE.yaml        the 'losses:' of the best law, for a scenario
  --law NAME              the law of --yaml: horton, green_ampt or philip
  --chart FILE            a picture: .svg, .png, .pdf, .txt; '-' for standard output
  --units mm|in           units of summary and chart
  --quiet                 no warnings and notes on standard error
)";

constexpr std::string_view kMore = R"(
TEST.yaml names the readings, relative to its own folder, and says how to fit them:

  title: Quarry Row, pit 3
  readings: pit3.csv
  ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}
  laws: [horton, green_ampt, philip]    # or kostiakov, modified_kostiakov; all unless given
  steady_rate: {use: fitted}            # or {fixed: 32 mm/h}, or {from: tail}: Horton's fc
  ignore_first: 0 min                   # left out at the start
  design_factor: 2                      # divides every rate for design; 1, none, unless given

The readings are a CSV, a row per reading, the time counted from the start of the test:

  time [min],drop [mm]
  5,12
  10,8.5
  15,7

  drop [mm]          fall of the water since the row before
  infiltrated [mm]   or: depth since the start
  volume_added [mL]  or: added since the row before to hold the level; needs the ring
  water_level [mm]   or: over any fixed mark; a column 'refill' marks the level after filling up
  pit                if there are several: the pit of each row; fitted apart and together

Examples:
  rainledger fit pit3.yaml
  rainledger fit pit3.csv --ring '300 mm, 600 mm' --chart pit3.svg
  rainledger fit pit3.yaml --yaml pit3_losses.yaml --law green_ampt

The file of --yaml holds 'losses:' as a surface of a scenario takes it.

Defaults: the summary in mm, no files.
A file appears whole or not at all, and none if the chart cannot be drawn; gnuplot draws it.
The summary goes to standard output; warnings, notes and errors go to standard error.
)";

constexpr std::string_view kCautionText = R"(
A test shows a small area under ponded water, on one day; rings disturb the soil, and a single
ring also loses water sideways. A design allowance is the engineer's.
)";

}  // namespace

std::string fit_help(HelpWanted page) {
    std::string out(kTop);
    if (page != HelpWanted::long_page) return out.append(kShort) + help_line(kTextColumn);
    out += option_lines(kFitOutputs, kTextColumn) + help_line(kTextColumn);
    out += "\nWith a CSV of readings\n" + option_lines(kFitReadings, kTextColumn);
    return out.append(kMore).append(kExitStatuses).append(kCautionText);
}

}  // namespace rainledger
