#pragma once

#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/reference/published_value.hpp"
#include "rainledger/report/summary.hpp"

// Published values as people and programs read them.
namespace rainledger {

/// One section of a look-up: rows of one table, or one computed value.
struct LookupSection {
    std::string heading;             ///< "Green-Ampt parameters by soil texture"
    std::vector<RowView> rows;       ///< may be empty where lines say it all
    std::string answer;              ///< the answer in a word: "B/D", "61"; may be empty
    std::vector<std::string> lines;  ///< sentences under the rows: how to use them, cautions
    std::string yaml;                ///< a fragment for a scenario; may be empty
};

/// The sections as text: values with ranges in units people read, faults and notes marked, each row
/// with its source and status. One row is shown in full, several as a table. A fragment stands four
/// blanks in, where the keys of a surface stand in a scenario.
[[nodiscard]] std::string lookup_text(std::span<const LookupSection> sections,
                                      const SummaryOptions& options);

/// The faults of printed values that stand in a fragment, a sentence each, in canonical units: what
/// nobody should copy without knowing it.
[[nodiscard]] std::vector<std::string> lookup_warnings(std::span<const LookupSection> sections);

/// The same as JSON, in canonical units: values as {"value", "low", "high", "printed_unit",
/// "fault"}, each row with its source, place and status; the warnings
/// beside. What a source does not give is null.
[[nodiscard]] std::string lookup_json(std::span<const LookupSection> sections);

}  // namespace rainledger
