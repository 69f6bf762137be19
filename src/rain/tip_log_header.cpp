#include "rain/tip_log_header.hpp"

#include <algorithm>
#include <array>
#include <string>
#include <string_view>
#include <utility>

#include "rain/csv_header_line.hpp"
#include "rainledger/rain/timestamp.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 2> kCountNames{"tips", "count"};

/// A column of depths or intensities, by its name or its unit.
bool gives_rain(const HeaderCell& cell) {
    if (std::ranges::find(kRainNames, std::string_view(cell.name)) != std::end(kRainNames))
        return true;
    return cell.unit &&
           (find_unit(*cell.unit, Dimension::depth) || find_unit(*cell.unit, Dimension::rate));
}

class TipHeaderReader {
public:
    TipHeaderReader(const CsvLine& line, const RecordLayout& layout, CsvProblems& problems)
        : header_(line, problems), layout_(layout) {
        columns_.line = line.number;
        columns_.separator = header_.separator();
        columns_.count = header_.cells().size();
        columns_.of_tips = true;
        columns_.stamped = true;
    }

    std::optional<CsvColumns> read() {
        if (!header_.is_sound()) return std::nullopt;
        find_time();
        find_counts();
        if (!header_.is_sound()) return std::nullopt;
        return columns_;
    }

private:
    void find_time();
    void report_no_time();
    void find_counts();
    [[nodiscard]] const HeaderCell* counts_by_name();
    void report_no_counts();

    HeaderLine header_;
    const RecordLayout& layout_;
    CsvColumns columns_;
};

void TipHeaderReader::find_time() {
    const auto& name = layout_.csv.time_column;
    const HeaderCell* const cell = name ? header_.titled(*name) : header_.called("time");
    if (cell == nullptr) {
        if (!name) report_no_time();
        return;
    }
    if (cell->unit || layout_.csv.time_unit)
        header_.error(cell->column.place,
                      "column " + shown(cell->column.title) + " holds elapsed times",
                      std::string(kTipsNeedStamps) + ", in a column 'time' without a unit");
    columns_.start = cell->column;
}

void TipHeaderReader::report_no_time() {
    const std::string& first = header_.cells().front().column.title;
    if (parse_stamp(first).value)
        header_.error(1, "the first row is data, not a header row",
                      "put a row 'time' above it, with a name for every column: 'time,tips'");
    else
        header_.error(1, "there is no time column",
                      column_titles(header_.cells()) +
                          "; call the one of timestamps 'time', or name it with time: in the "
                          "scenario");
}

const HeaderCell* TipHeaderReader::counts_by_name() {
    const HeaderCell* const tips = header_.called(kCountNames[0]);
    const HeaderCell* const count = header_.called(kCountNames[1]);
    if (tips != nullptr && count != nullptr)
        header_.error(std::max(tips->column.place, count->column.place),
                      "there are two columns of counts, " + shown(tips->column.title) + " and " +
                          shown(count->column.title),
                      "state which to read in the scenario with rain:");
    return tips != nullptr ? tips : count;
}

void TipHeaderReader::find_counts() {
    const auto& name = layout_.csv.rain_column;
    const HeaderCell* const cell = name ? header_.titled(*name) : counts_by_name();
    columns_.has_rain = cell != nullptr;
    if (cell == nullptr) {
        if (!name) report_no_counts();
        return;
    }
    columns_.rain = cell->column;
    if (columns_.start && columns_.start->index == cell->column.index)
        header_.error(cell->column.place, "this column is named for both time and rain",
                      "name two different columns under time: and rain:");
}

/// A row for each tip needs no counts, but depths say that the rows are something else.
void TipHeaderReader::report_no_counts() {
    if (layout_.running_count)
        header_.error(1, "there is no column of counts",
                      column_titles(header_.cells()) +
                          "; call the counter's 'count', or name it with rain: in the scenario");
    for (const HeaderCell& cell : header_.cells())
        if (gives_rain(cell))
            header_.error(cell.column.place,
                          "column " + shown(cell.column.title) +
                              " gives rain, but a row of a tip log is a tip",
                          "for interval data leave out tip:; where every row is one tip take the "
                          "column out; a column of counts is named with rain: in the scenario");
}

}  // namespace

std::optional<CsvColumns> read_tip_header(const CsvLine& line, const RecordLayout& layout,
                                          CsvProblems& problems) {
    return TipHeaderReader(line, layout, problems).read();
}

}  // namespace rainledger
