#include <cstddef>
#include <string>
#include <string_view>

#include "cli/help.hpp"
#include "cli/help_parts.hpp"
#include "cli/lookup_options.hpp"
#include "rainledger/report/caution.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kTextColumn = 29;

constexpr std::string_view kTop =
    R"(rainledger lookup: published parameters, each with its source, edition and status.

Usage: rainledger lookup TOPIC [NAME] [options]

Topics:
)";

constexpr std::string_view kMore = R"(
A name may be typed as it comes: sandy-loam, 'Sandy Loam', sandy loam. A part of it shows every
row that holds it, no name the whole table. Each row says where it comes from, in which edition,
and whether it was seen there (confirmed), is recalled (from memory) or is a habit of the trade
(common practice). A printed number that does not fit is kept as printed and marked, with what
to take instead beside it.

Where a row makes one, a fragment for a scenario follows: it stands as the keys of a surface do,
in the source's own unit, and names the table.

Examples:
  rainledger lookup soil loam --saturation '40 %'
  rainledger lookup texture --sand 42 --clay 18 --organic 2.5
  rainledger lookup cover 'open space' --condition good --soil-group B
  rainledger lookup cover 'open space' --condition good --soil-group B --impervious '25 %' \
      --connected '80 %'
  rainledger lookup soil-group --conductivity '3.4 mm/h' --water-table '0.5 m'
  rainledger lookup antecedent 61
  rainledger lookup storage --slope '2 %'
  rainledger lookup horton loam --units in
  rainledger lookup soil --json soils.json
)";

}  // namespace

std::string lookup_help(HelpWanted page) {
    std::string out = std::string(kTop) + topic_lines() + "\n";
    out += option_lines(kLookupOptions, kTextColumn) + help_line(kTextColumn);
    if (page == HelpWanted::short_page) return out;
    out.append(kMore).append(kExitStatuses);
    return out + "\n" + std::string(kLookupCaution) + "\n";
}

}  // namespace rainledger
