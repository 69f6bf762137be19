#include "rain/statistics_unit.hpp"

#include <cstddef>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

namespace rainledger {
namespace {

constexpr std::string_view kHowToWrite =
    "write it in the header, as in '10 yr [mm]', or in a line above it: 'depth [mm]', "
    "'intensity [in/h]'";

/// A unit where it stands.
struct FoundUnit {
    ValueUnit unit;
    std::size_t line = 0;
    std::size_t column = 0;
};

bool is_letter(char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z');
}

std::size_t end_of_word(std::string_view text, std::size_t at) {
    while (at < text.size() && is_letter(text[at]))
        ++at;
    return at;
}

/// The end of "/h", " / hour" or " per hour" behind a word that ends at `at`; `at` if there is
/// none.
std::size_t end_of_rate(std::string_view text, std::size_t at) {
    std::size_t next = text.find_first_not_of(' ', at);
    if (next == std::string_view::npos) return at;
    if (text[next] == '/')
        ++next;
    else if (next > at && text.substr(next).starts_with("per "))
        next += std::string_view("per ").size();
    else
        return at;
    next = text.find_first_not_of(' ', next);
    if (next == std::string_view::npos) return at;
    const std::size_t end = end_of_word(text, next);
    return end > next ? end : at;
}

bool stands_in_brackets(std::string_view text, std::size_t from, std::size_t to) {
    return from > 0 && to < text.size() && (text[from - 1] == '(' || text[from - 1] == '[') &&
           (text[to] == ')' || text[to] == ']');
}

/// Whether a unit in running text is one of rain: metres and feet are heights and distances there,
/// and 'in' is a word unless it stands in brackets.
bool is_of_rain(const ValueUnit& unit, bool in_brackets) {
    const std::string small = lower(unit.name);
    const bool millimetres = small.starts_with("mm") || small.starts_with("millim");
    const bool centimetres = small.starts_with("cm") || small.starts_with("centim");
    const bool inches = small.starts_with("inch") || (small.starts_with("in") && unit.is_rate) ||
                        (small == "in" && in_brackets);
    return millimetres || centimetres || inches;
}

/// The units that running text states.
void find_units(const CsvLine& line, std::vector<FoundUnit>& found) {
    const std::string_view text = line.text;
    std::size_t at = 0;
    while (at < text.size()) {
        if (!is_letter(text[at])) {
            ++at;
            continue;
        }
        const std::size_t word = end_of_word(text, at);
        const std::size_t rate = end_of_rate(text, word);
        std::size_t end = rate;
        auto unit = value_unit_of(text.substr(at, rate - at));
        if (!unit && rate != word) unit = value_unit_of(text.substr(at, (end = word) - at));
        if (unit && is_of_rain(*unit, stands_in_brackets(text, at, end)))
            found.push_back({*unit, line.number, at + 1});
        else
            end = word;
        at = end;
    }
}

/// The units in the brackets of a header's cells; false if one of them is no unit.
bool find_units(const StatisticsRow& header, std::vector<FoundUnit>& found, CsvProblems& problems) {
    bool all_known = true;
    for (std::size_t i = 1; i < header.cells.size(); ++i) {
        const StatisticsCell& cell = header.cells[i];
        auto written = take_apart_label(cell.text).unit;
        if (!written && value_unit_of(cell.text)) written = cell.text;
        if (!written) continue;
        if (const auto unit = value_unit_of(*written)) {
            found.push_back({*unit, header.line.number, cell.column});
        } else {
            all_known = false;
            problems.error(header.line.number, cell.column,
                           "unit " + shown(*written) + " is neither one of depth nor of intensity",
                           "units of depth: " + std::string(accepted_units(Dimension::depth)) +
                               "; of intensity: mm/h, in/h and others");
        }
    }
    return all_known;
}

/// The units of a row that holds nothing else.
void take_units(const StatisticsRow& units, std::vector<FoundUnit>& found) {
    for (std::size_t i = 1; i < units.cells.size(); ++i)
        found.push_back({*value_unit_of(unit_part(units.cells[i].text)), units.line.number,
                         units.cells[i].column});
}

/// Whether `word` stands in the text by itself: 'depth-duration' is a kind of table, not of value.
bool says_word(std::string_view text, std::string_view word) {
    const std::string small = lower(text);
    for (std::size_t at = small.find(word); at != std::string::npos;
         at = small.find(word, at + 1)) {
        const std::size_t end = at + word.size();
        const auto joins = [](char c) { return is_letter(c) || c == '-'; };
        if ((at == 0 || !joins(small[at - 1])) && (end == small.size() || !joins(small[end])))
            return true;
    }
    return false;
}

/// What the words say that the values are; both or neither say nothing.
struct StatedKind {
    bool depth = false;
    bool intensity = false;
};

StatedKind stated_kind(std::span<const CsvLine> above, const StatisticsRow& header) {
    StatedKind kind;
    const auto hear = [&](std::string_view text) {
        kind.depth = kind.depth || says_word(text, "depth") || says_word(text, "depths");
        kind.intensity =
            kind.intensity || says_word(text, "intensity") || says_word(text, "intensities");
    };
    for (const CsvLine& line : above)
        hear(line.text);
    hear(header.line.text);
    return kind;
}

void check_kind(const FoundUnit& found, const StatedKind& kind, CsvProblems& problems) {
    if (kind.depth == kind.intensity || found.unit.is_rate == kind.intensity) return;
    const std::string is = found.unit.is_rate ? "intensity" : "depth";
    const std::string said = kind.intensity ? "intensity" : "depth";
    problems.error(found.line, found.column,
                   "unit " + shown(found.unit.name) + " is one of " + is +
                       ", but the table is said to hold " + said,
                   "write the unit that the values have, or the right word for them");
}

}  // namespace

StatedUnit unit_of_values(std::span<const CsvLine> above, const StatisticsBlock& block,
                          CsvProblems& problems) {
    const StatisticsRow& header = block.header;
    std::vector<FoundUnit> found;
    for (const CsvLine& line : above)
        find_units(line, found);
    const bool all_known = find_units(header, found, problems);
    if (block.units) take_units(*block.units, found);
    if (found.empty()) {
        if (all_known)
            problems.error(header.line.number, 1, "the table does not say the unit of its values",
                           std::string(kHowToWrite));
        return {};
    }
    const FoundUnit& first = found.front();
    for (const FoundUnit& other : found) {
        if (is_same_unit(first.unit, other.unit)) continue;
        problems.error(other.line, other.column,
                       "unit " + shown(other.unit.name) + " contradicts " + shown(first.unit.name) +
                           " in line " + std::to_string(first.line),
                       "all the values of a table have one unit");
        return {std::nullopt, true};
    }
    check_kind(first, stated_kind(above, header), problems);
    return {first.unit, false};
}

}  // namespace rainledger
