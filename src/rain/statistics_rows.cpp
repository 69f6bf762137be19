#include "rain/statistics_rows.hpp"

#include <algorithm>
#include <initializer_list>
#include <utility>

#include "rain/statistics_labels.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

bool says_one_of(std::string_view text, std::initializer_list<std::string_view> words) {
    const std::string small = lower(text);
    return std::ranges::any_of(
        words, [&](std::string_view word) { return small.find(word) != std::string::npos; });
}

/// With another separator than the comma, a single comma is a decimal one.
void take_decimal_comma(std::string& cell) {
    const std::size_t comma = cell.find(',');
    if (comma == std::string::npos || cell.find_first_of(".,", comma + 1) != std::string::npos)
        return;
    if (cell.find('.') == std::string::npos) cell[comma] = '.';
}

StatisticsRow cut_row(const CsvLine& line, char separator) {
    StatisticsRow row{line, {}, {}};
    const char* at = line.text.data();
    const char* const end = at + line.text.size();
    std::string buffer;
    while (true) {
        const CsvCell cell = cut_cell(at, end, separator, buffer);
        if (cell.form != CellForm::sound && !row.unsound) row.unsound = {{}, cell.begin, cell.form};
        row.cells.push_back({std::string(cell.text), line.column_of(cell.begin)});
        if (separator != ',') take_decimal_comma(row.cells.back().text);
        if (at == end) break;
        ++at;
    }
    while (!row.cells.empty() && row.cells.back().text.empty())
        row.cells.pop_back();
    return row;
}

bool is_data(const StatisticsRow& row) {
    return duration_in(row.label()).has_value();
}

/// A unit of the values in each cell behind the first, with or without brackets.
bool is_row_of_units(const StatisticsRow& row) {
    return row.cells.size() > 1 && !is_data(row) &&
           std::all_of(row.cells.begin() + 1, row.cells.end(), [](const StatisticsCell& cell) {
               return value_unit_of(unit_part(cell.text)).has_value();
           });
}

/// The return periods of a row that holds nothing else behind its label: >= 1 and rising.
std::vector<double> periods_of(const StatisticsRow& row) {
    std::vector<double> periods;
    for (std::size_t i = 1; i < row.cells.size(); ++i) {
        const auto period = period_in(take_apart_label(row.cells[i].text).name);
        if (!period || !(period->years >= 1.0)) return {};
        if (!periods.empty() && !(period->years > periods.back())) return {};
        periods.push_back(period->years);
    }
    return periods;
}

bool writes_years(const StatisticsRow& row) {
    return std::ranges::any_of(row.cells, [](const StatisticsCell& cell) {
        const auto period = period_in(take_apart_label(cell.text).name);
        return period && period->has_unit;
    });
}

bool is_row_of_periods(const StatisticsRow& row) {
    if (is_data(row)) return false;
    const std::size_t periods = periods_of(row).size();
    return periods >= 2 || (periods == 1 && (writes_years(row) || names_durations(row.label())));
}

/// A header, judged by itself and by the row beneath it: that one may tell where its own cells do
/// not, or hold a slip.
/// A row that begins with a number, 0 too, is one of figures: of rain from 0 to 5 min, say.
bool is_header(const StatisticsRow& row, const StatisticsRow* next) {
    if (row.cells.size() < 2 || is_data(row) || parse_number(row.label())) return false;
    const bool above_data = next != nullptr && (is_data(*next) || is_row_of_units(*next));
    const bool above_periods = next != nullptr && is_row_of_periods(*next);
    const bool labelled = names_durations(row.label());
    if (!is_row_of_periods(row))
        return labelled && !above_periods && (above_data || is_list_header(row));
    return above_data || labelled || writes_years(row) ||
           says_one_of(row.label(), {"year", "return", "recurrence"});
}

/// Text alone: nothing in it could be a depth.
bool is_text(const StatisticsRow& row) {
    const auto digit = [](char c) { return c >= '0' && c <= '9'; };
    if (row.cells.size() <= 1) return row.label().empty() || !digit(row.label().front());
    return std::none_of(row.cells.begin() + 1, row.cells.end(), [](const StatisticsCell& cell) {
        return parse_number(cell.text).has_value();
    });
}

bool names_a_limit(std::string_view heading) {
    return says_one_of(heading, {"upper", "lower", "confidence"});
}

/// The heading of a block of confidence limits; a place may be called 'Lower Millbrook', and
/// estimates may be said to have confidence limits.
bool heads_limits(std::string_view heading) {
    const bool side = says_one_of(heading, {"upper", "lower"});
    if (side) return says_one_of(heading, {"bound", "limit", "confidence", "interval"});
    return says_one_of(heading, {"confidence"}) && !says_one_of(heading, {"estimate"});
}

/// Sorts the rows below the first header into blocks.
class BlockFinder {
public:
    explicit BlockFinder(StatisticsLayout& layout) : layout_(layout) {}

    void open(StatisticsRow header) {
        periods_ = periods_of(header);
        if (!layout_.preamble.empty()) heading_ = &layout_.preamble.back();
        begin(std::move(header));
    }
    void add(const CsvLine& line, StatisticsRow row);

private:
    void begin(StatisticsRow header) {
        StatisticsBlock block;
        block.heading_line = heading_ != nullptr ? heading_->number : header.line.number;
        if (heading_ != nullptr) block.heading = trimmed(heading_->text);
        block.is_confidence_limit = heads_limits(block.heading);
        block.header = std::move(header);
        layout_.blocks.push_back(std::move(block));
        heading_ = nullptr;
        is_open_ = true;
    }

    [[nodiscard]] bool awaits_units() const {
        return layout_.blocks.back().rows.empty() && !layout_.blocks.back().units;
    }

    StatisticsLayout& layout_;
    std::vector<double> periods_;
    const CsvLine* heading_ = nullptr;
    bool is_open_ = false;
};

void BlockFinder::add(const CsvLine& line, StatisticsRow row) {
    const bool below_limit_heading = heading_ != nullptr && names_a_limit(heading_->text);
    if (is_data(row) && !is_open_ && below_limit_heading) {
        begin(layout_.blocks.front().header);
        layout_.blocks.back().is_confidence_limit = true;
    }
    if (is_data(row) && is_open_) {
        layout_.blocks.back().rows.push_back(std::move(row));
    } else if (is_open_ && awaits_units() && is_row_of_units(row)) {
        layout_.blocks.back().units = std::move(row);
    } else if (is_row_of_periods(row) && (heading_ != nullptr || periods_of(row) == periods_)) {
        begin(std::move(row));
    } else if (is_text(row) && !row.unsound) {
        heading_ = &line;
        is_open_ = false;
    } else {
        layout_.strays.push_back(std::move(row));
    }
}

}  // namespace

bool names_durations(std::string_view cell) {
    const LabelParts parts = take_apart_label(cell);
    if (says_one_of(parts.name, {"duration"})) return true;
    if (parts.name.empty()) return parts.unit && time_unit_of(*parts.unit);
    return time_unit_of(parts.name).has_value();
}

bool is_list_header(const StatisticsRow& header) {
    return header.cells.size() == 2 && names_durations(header.label()) &&
           (says_one_of(header.cells[1].text, {"depth", "intensity", "rain", "precipitation"}) ||
            value_unit_of(header.cells[1].text));
}

StatisticsLayout find_statistics_blocks(std::span<const CsvLine> lines) {
    StatisticsLayout layout;
    BlockFinder finder(layout);
    char separator = ',';
    for (std::size_t i = 0; i < lines.size(); ++i) {
        if (!layout.blocks.empty()) {
            finder.add(lines[i], cut_row(lines[i], separator));
            continue;
        }
        separator = separator_of(lines[i].text);
        StatisticsRow row = cut_row(lines[i], separator);
        const bool last = i + 1 == lines.size();
        const StatisticsRow next = last ? StatisticsRow{} : cut_row(lines[i + 1], separator);
        if (is_header(row, last ? nullptr : &next))
            finder.open(std::move(row));
        else
            layout.preamble.push_back(lines[i]);
    }
    return layout;
}

bool is_row_of_depths(const CsvLine& line) {
    const StatisticsRow row = cut_row(line, separator_of(line.text));
    const auto duration = duration_in(row.label());
    return duration && duration->unit && row.cells.size() > 1 && parse_number(row.cells[1].text);
}

bool is_row_of_durations(const CsvLine& line) {
    const StatisticsRow row = cut_row(line, separator_of(line.text));
    return row.cells.size() > 2 &&
           std::all_of(row.cells.begin() + 1, row.cells.end(), [](const StatisticsCell& cell) {
               const auto duration = duration_in(take_apart_label(cell.text).name);
               return duration && duration->unit;
           });
}

}  // namespace rainledger
