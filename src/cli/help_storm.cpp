#include <cstddef>
#include <string>
#include <string_view>

#include "cli/help.hpp"
#include "cli/help_parts.hpp"
#include "cli/storm_options.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kTextColumn = 26;

constexpr std::string_view kTitle =
    "rainledger storm: the rain alone, from statistics, a gauge record or a scenario.\n";

constexpr std::string_view kShort = R"(
Usage:
  rainledger storm TABLE.csv                          the table of statistics as depths
  rainledger storm TABLE.csv --fit-formula            and intensity formulas fitted to it
  rainledger storm TABLE.csv --duration '2 h' --every '5 min'      a design storm of it
      [--return-period '10 yr'] [--pattern NAME] [--peak-at SHARE] [--curve NAME]
  rainledger storm RECORD.csv [--tip '0.2 mm']        the events of a gauge record
      [--dry-spell '6 h'] [--threshold DEPTH] [--zone NAME] [--every DURATION]
      [--spread-tips] [--events] [--sort ORDER] [--statistics TABLE.csv]
  rainledger storm RECORD.csv --event largest         one event of it, or --event NUMBER
  rainledger storm SCENARIO.yaml [--storm NAME]       the storms of a scenario

  --csv FILE.csv          the steps of one storm, as a rain file for scenarios
  --json FILE             everything, for programs; '-' for standard output
  --chart FILE            a picture: .svg, .png, .pdf, .txt; '-' for standard output
  --units mm|in           units of summary and chart
  --every DURATION        steps of this length
  --quiet                 no warnings and notes on standard error
)";

constexpr std::string_view kUsage = R"(
Usage: rainledger storm INPUT [options]

INPUT is told by what stands in it:
  a table of rainfall statistics (CSV)   printed as depths; with --duration, a design storm
  a gauge record (CSV with dates)        its events listed; with --event, one of them
  a rain file (CSV of elapsed times)     one storm
  a scenario (.yaml)                     the storms in it; surfaces are not needed

)";

constexpr std::string_view kDesignMore = R"(
From a table to a storm. Save the depths of your place as CSV: a row per duration, a column
per return period, the unit in square brackets. Take it from the weather service's or the
county's rainfall atlas; their own CSV tables are mostly read as they are.

  duration,2 yr [mm],10 yr [mm],100 yr [mm]
  5 min,8.2,12.5,18.6
  15 min,15.5,23.5,35.0
  1 h,27.1,41.0,61.1
  2 h,31.7,48.0,71.5

Examples:
  rainledger storm county.csv --return-period '10 yr' --duration '2 h' --every '5 min'
  rainledger storm county.csv --return-period '10 yr' --duration '2 h' --every '5 min' \
      --csv storm.csv --chart storm.svg

  --return-period  the law or the client says how rare: common are 2 to 10 yr for drains,
                   25 to 100 yr for basins and overflow paths
  --duration       no shorter than the water takes from the farthest corner to the outlet
  --every          no longer than the shortest duration that matters; 5 min is common
Between durations and return periods the table is interpolated; outside it nothing is made up.

Patterns
  alternating_blocks  holds the depth of every duration at once; when in doubt, this one
  triangular          up to twice the mean and down again; small areas, hand checks
  uniform             constant; comparison with the rational method alone
  mass_curve          a published curve named by --curve, where the local code asks for it:
                      nrcs_I, nrcs_IA, nrcs_II, nrcs_III (24 h); huff_1 (up to 6 h),
                      huff_2 (to 12 h), huff_3 (to 24 h), huff_4 (longer)
  keifer_chu          a smooth peak; needs a formula: --fit-formula prints one to put into
                      a scenario
The peak lies in the middle unless --peak-at says otherwise; 0.3 to 0.5 is common.
)";

constexpr std::string_view kRecordMore = R"(
From a gauge record to a storm. A tip log is a row per tip with its time in a column 'time';
interval data are a rain file with dates. Holes count as dry, and each event says so.

Examples:
  rainledger storm logger.csv --tip '0.2 mm' --events --sort depth
  rainledger storm logger.csv --tip '0.2 mm' --statistics county.csv --sort rarity
  rainledger storm logger.csv --tip '0.2 mm' --event largest --every '5 min' --csv storm.csv

In a scenario the same stand under 'storm:', as 'design:' and 'record:'; a file of --csv as
'hyetograph: storm.csv'.

Defaults: the summary in mm, the steps that the rain has, no files.
A file appears whole or not at all, and none if the chart cannot be drawn; gnuplot draws it.
The summary goes to standard output; warnings, notes and errors go to standard error.
)";

std::string long_page() {
    std::string out(kTitle);
    out.append(kUsage);
    out += option_lines(kStormOutputs, kTextColumn) + help_line(kTextColumn);
    out += "\nWith a scenario\n" + option_lines(kStormScenario, kTextColumn);
    out += "\nWith a table of statistics\n" + option_lines(kStormDesign, kTextColumn);
    out += "\nWith a gauge record\n" + option_lines(kStormRecord, kTextColumn);
    out += "\nWith a gauge record, or with a storm that a scenario takes out of one\n" +
           option_lines(kStormEvents, kTextColumn);
    out.append(kDesignMore).append(kRecordMore).append(kExitStatuses);
    out.append("\n").append(kRainCaution).append("\n");
    return out;
}

}  // namespace

std::string storm_help(HelpWanted page) {
    if (page == HelpWanted::long_page) return long_page();
    return std::string(kTitle) + std::string(kShort) + help_line(kTextColumn);
}

}  // namespace rainledger
