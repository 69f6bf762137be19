#include "rain/csv_header_cells.hpp"

#include <algorithm>
#include <filesystem>
#include <initializer_list>
#include <utility>

#include "rain/csv_text.hpp"
#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

bool holds_any(std::string_view name, std::initializer_list<std::string_view> words) {
    return std::ranges::any_of(
        words, [&](auto word) { return name.find(word) != std::string_view::npos; });
}

/// What stands in round brackets at the end of a title: "mm" of "Rain (mm)".
std::optional<std::string> in_round_brackets(const HeaderCell& cell) {
    const std::string& title = cell.column.title;
    const std::size_t bracket = title.rfind('(');
    if (bracket == std::string::npos || !title.ends_with(')')) return std::nullopt;
    return std::string(
        trimmed(std::string_view(title).substr(bracket + 1, title.size() - bracket - 2)));
}

/// The name of a cell without round brackets.
std::string_view bare_name(const HeaderCell& cell) {
    return trimmed(std::string_view(cell.name).substr(0, cell.name.find('(')));
}

/// The unit of `dimension` that a title shows in either kind of bracket.
std::optional<std::string> shown_unit(const HeaderCell& cell, Dimension dimension) {
    const auto text = cell.unit ? cell.unit : in_round_brackets(cell);
    if (!text) return std::nullopt;
    for (const std::string& unit : {*text, lower(*text)})
        if (find_unit(unit, dimension)) return unit;
    return std::nullopt;
}

bool speaks_of_time(const HeaderCell& cell) {
    return shown_unit(cell, Dimension::time) ||
           holds_any(cell.name, {"time", "date", "stamp", "start", "end", "minute", "hour"});
}

bool speaks_of_rain(const HeaderCell& cell) {
    return shown_unit(cell, Dimension::depth) || shown_unit(cell, Dimension::rate) ||
           holds_any(cell.name, {"rain", "precip", "depth", "intens"});
}

const HeaderCell* likely_rain(std::span<const HeaderCell> cells) {
    const HeaderCell* likely = nullptr;
    for (const HeaderCell& cell : cells) {
        if (speaks_of_time(cell) || cell.column.title.empty()) continue;
        if (speaks_of_rain(cell)) return &cell;
        likely = &cell;
    }
    return likely;
}

const HeaderCell* likely_time(std::span<const HeaderCell> cells) {
    const auto found = std::ranges::find_if(cells, speaks_of_time);
    return found == cells.end() ? nullptr : &*found;
}

/// A text in the single quotes of YAML.
std::string yaml_quoted(std::string_view text) {
    std::string out = "'";
    for (const char c : text)
        out += c == '\'' ? "''" : std::string(1, c);
    return out + "'";
}

std::string time_keys(const HeaderCell& cell) {
    const bool starts = holds_any(cell.name, {"start", "begin"});
    std::string out = ", time: " + yaml_quoted(cell.column.title);
    const auto unit = shown_unit(cell, Dimension::time);
    if (unit && unit != cell.unit) out += ", time_unit: " + *unit;
    return out + (starts ? ", stamp: start" : ", stamp: end");
}

std::string rain_keys(const HeaderCell& cell) {
    const auto rate = shown_unit(cell, Dimension::rate);
    const auto depth = shown_unit(cell, Dimension::depth);
    std::string kind = "depth";
    if (rate || (!depth && holds_any(cell.name, {"intens", "rate"})))
        kind = "intensity";
    else if (holds_any(cell.name, {"cum", "accum", "total"}))
        kind = "cumulative";
    const std::string unit = rate ? *rate : depth.value_or(kind == "intensity" ? "mm/h" : "mm");
    std::string out = ", rain: " + yaml_quoted(cell.column.title) + ", kind: " + kind;
    if (unit != cell.unit) out += ", unit: " + unit;
    return out;
}

/// The lines of a scenario that name the columns, or nothing where none is likely.
std::string scenario_advice(std::span<const HeaderCell> cells, const std::string& file,
                            LackingColumns lacking) {
    const HeaderCell* const time = lacking.time ? likely_time(cells) : nullptr;
    const HeaderCell* const rain = lacking.rain ? likely_rain(cells) : nullptr;
    if ((lacking.time && time == nullptr) || (lacking.rain && rain == nullptr)) return {};
    const std::string name = std::filesystem::path(file).filename().string();
    const bool plain = name.find_first_of(" ,[]{}#:'\"&*!|>%@`") == std::string::npos;
    std::string out = "hyetograph: {file: " + (plain ? name : yaml_quoted(name));
    if (time != nullptr) out += time_keys(*time);
    if (rain != nullptr) out += rain_keys(*rain);
    return "; or say in the scenario: " + out + "}";
}

/// "units stand in square brackets: 'depth [mm]'" where a known name has round ones, else empty.
std::string bracket_advice(std::span<const HeaderCell> cells,
                           std::span<const std::string_view> known) {
    for (const HeaderCell& cell : cells) {
        const auto unit = in_round_brackets(cell);
        if (unit && std::ranges::find(known, bare_name(cell)) != known.end())
            return "units stand in square brackets: '" + std::string(bare_name(cell)) + " [" +
                   *unit + "]'";
    }
    return {};
}

}  // namespace

HeaderCell take_apart(CsvColumn column) {
    HeaderCell cell;
    const std::string_view title = column.title;
    const std::size_t bracket = title.rfind('[');
    if (bracket != std::string_view::npos && title.ends_with(']')) {
        cell.name = lower(trimmed(title.substr(0, bracket)));
        cell.unit = trimmed(title.substr(bracket + 1, title.size() - bracket - 2));
    } else {
        cell.name = lower(title);
    }
    cell.column = std::move(column);
    return cell;
}

std::string column_titles(std::span<const HeaderCell> cells) {
    std::string out = "columns here: ";
    for (const HeaderCell& cell : cells)
        out += (cell.column.index > 0 ? ", " : "") + shown(cell.column.title);
    return out;
}

std::string column_advice(std::span<const HeaderCell> cells,
                          std::span<const std::string_view> known, std::string_view example,
                          const std::string& file, LackingColumns lacking) {
    if (cells.size() == 1)
        return "if this line is a note, begin it with #; " + column_titles(cells) + "; " +
               std::string(example);
    const std::string by_scenario = scenario_advice(cells, file, lacking);
    const std::string brackets = bracket_advice(cells, known);
    if (!brackets.empty()) return brackets + by_scenario;
    std::string slip;
    for (const HeaderCell& cell : cells) {
        const auto near = nearest(bare_name(cell), known);
        if (near && slip.empty())
            slip = "is " + shown(cell.column.title) + " meant to be " + shown(*near) + "? ";
    }
    return slip + column_titles(cells) + "; " + std::string(example) + by_scenario;
}

std::string unit_guess(std::string_view unit, Dimension dimension) {
    const std::string small = lower(unit);
    if (small == unit || !find_unit(small, dimension)) return {};
    return "did you mean " + shown(small) + "? ";
}

}  // namespace rainledger
