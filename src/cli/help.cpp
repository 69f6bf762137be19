#include "cli/help.hpp"

#include <algorithm>
#include <span>
#include <string_view>

#include "cli/help_parts.hpp"
#include "cli/losses_options.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kTextColumn = 24;

constexpr std::string_view kProgramShort =
    R"(rainledger: where the rain goes. Rainfall losses, step by step, in a ledger that closes.

Usage:
  rainledger losses SCENARIO [options]   the loss ledger of a site under its storms
  rainledger storm INPUT [options]       a storm from statistics, a gauge record or a scenario
  rainledger fit TEST [options]          infiltration laws fitted to a field test
  rainledger lookup TOPIC [NAME]         published parameters, with their sources
  rainledger schema [field_test]         JSON Schema of the YAML files, for editors

  -h, --help            help on the program; after a command, help on the command
  --version             the version
)";

constexpr std::string_view kProgramMore = R"(
A scenario is a YAML file: a storm (its hyetograph) and the surfaces of a site, each with
its area and the way it loses rain. The program follows every millimetre: intercepted,
infiltrated, ponded, run onto another surface, or left over as excess.

Examples:
  rainledger losses tannery_lane.yaml
  rainledger losses tannery_lane.yaml --ledger ledger.csv --json results.json
  rainledger losses tannery_lane.yaml --units in
  rainledger storm county.csv --return-period '10 yr' --duration '2 h' --every '5 min'
  rainledger fit pit3.yaml --yaml pit3_losses.yaml

Every quantity in a scenario carries its unit ('12.5 mm', '1.2 in/hr', '0.42 ha').
)";

constexpr std::string_view kCautionText = R"(
Results are estimates from assumed rain and losses; local codes and a licensed engineer decide.
)";

constexpr std::string_view kLossesTop =
    R"(rainledger losses: the loss ledger of a site under its storms; a summary on standard output.

Usage: rainledger losses SCENARIO [options]

)";

constexpr std::string_view kLossesMore = R"(
SCENARIO is a YAML file with a storm and surfaces; file names in it are relative to its own
folder. A short one:

  title: Quarry Row yard
  storm:
    steps: {every: 5 min, depths: [0.4, 1.1, 2.6, 0.9], unit: mm}
  surfaces:
    lawn:
      area: 0.28 ha
      depression_storage: 4 mm
      losses:
        horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 1/h}
    yard:
      area: 1000 m2
      losses: impervious
      runs_onto: {lawn: 40 %}

Examples:
  rainledger losses quarry_row.yaml
  rainledger losses quarry_row.yaml --ledger ledger.csv --every '15 min'
  rainledger losses quarry_row.yaml --json - > results.json
  rainledger losses quarry_row.yaml --chart lawn.svg --surface lawn

Defaults: the summary in mm, the ledger at the rain's own steps, no files.
A file appears whole or not at all, and none if the chart cannot be drawn; gnuplot draws it.
A chart shows the ledger of one surface under one storm, where --storm and --surface choose them
or there are no others; else it sets surfaces, or storms, side by side.
Ledger and JSON use mm, mm/h, h, m2, m3 and L/s whatever --units says.
The summary goes to standard output; warnings, notes and errors go to standard error.
)";

constexpr std::string_view kSchemaTop =
    R"(rainledger schema: JSON Schema (draft 2020-12) of the YAML files, on standard output.

Usage: rainledger schema [scenario]      of scenarios
       rainledger schema field_test      of field tests, as 'rainledger fit' reads them

)";

constexpr std::string_view kSchemaMore = R"(
An editor that knows the schema completes keys and marks mistakes while you type.

Example:
  rainledger schema > scenario.schema.json
  rainledger schema field_test > field_test.schema.json
)";

std::string lines_of(const OptionRow& row, std::size_t column) {
    std::string head = "  --" + std::string(row.name);
    if (!row.argument.empty()) head += " " + std::string(row.argument);
    head.resize(std::max(head.size() + 2, column), ' ');
    std::string out;
    std::string_view text = row.text;
    while (true) {
        const std::size_t line_end = text.find('\n');
        out += head + std::string(text.substr(0, line_end)) + "\n";
        if (line_end == std::string_view::npos) return out;
        text.remove_prefix(line_end + 1);
        head.assign(head.size(), ' ');
    }
}

std::string page_of(std::string_view top, std::span<const OptionRow> rows, std::string_view more,
                    HelpWanted page) {
    std::string out(top);
    out += option_lines(rows, kTextColumn) + help_line(kTextColumn);
    if (page == HelpWanted::long_page) out.append(more).append(kExitStatuses);
    return out;
}

}  // namespace

std::string option_lines(std::span<const OptionRow> rows, std::size_t column) {
    std::string out;
    for (const OptionRow& row : rows)
        out += lines_of(row, column);
    return out;
}

std::string help_line(std::size_t column) {
    std::string out = "  -h, --help";
    out.resize(column, ' ');
    return out + "-h is one screen, --help the whole page\n";
}

std::string program_help(HelpWanted page) {
    std::string out(kProgramShort);
    if (page == HelpWanted::long_page)
        out.append(kProgramMore).append(kExitStatuses).append(kCautionText);
    return out;
}

std::string losses_help(HelpWanted page) {
    std::string out = page_of(kLossesTop, kLossesOptions, kLossesMore, page);
    if (page == HelpWanted::long_page) out += kCautionText;
    return out;
}

std::string schema_help(HelpWanted page) {
    return page_of(kSchemaTop, {}, kSchemaMore, page);
}

}  // namespace rainledger
