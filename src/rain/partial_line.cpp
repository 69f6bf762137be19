#include "rain/partial_line.hpp"

#include <algorithm>
#include <cstddef>
#include <string_view>
#include <utility>

#include "rain/csv_opening.hpp"
#include "rain/csv_rows.hpp"

namespace rainledger {
namespace {

std::size_t begin_of_line(std::string_view text, std::size_t end) {
    const std::size_t newline = text.substr(0, end).rfind('\n');
    return newline == std::string_view::npos ? 0 : newline + 1;
}

/// The last line above `end` that says something; empty if there is none.
std::string_view line_above(std::string_view text, std::size_t end, char separator) {
    while (end > 0) {
        const std::size_t begin = begin_of_line(text, end - 1);
        CsvLines lines(text.substr(begin, end - begin));
        lines.use_separator(separator);
        CsvLine line;
        if (lines.next(line)) return line.text;
        end = begin;
    }
    return {};
}

class LastLine {
public:
    LastLine(const CsvColumns& columns, const CsvLayout& layout)
        : columns_(columns),
          zone_(find_zone(layout, silence_.problems())),
          reader_(columns, layout, zone_, silence_.problems()) {}

    /// Whether `last` makes a row below `above`.
    [[nodiscard]] bool makes_row(std::string_view above, std::string_view last);

private:
    [[nodiscard]] const RowTime& time_of(const CsvRow& row) const {
        return columns_.start ? row.start : row.end;
    }

    const CsvColumns& columns_;
    SilentProblems silence_;
    std::optional<Zone> zone_;
    CsvRowReader reader_;
};

bool LastLine::makes_row(std::string_view above, std::string_view last) {
    CsvRow before;
    CsvRow row;
    const bool has_before = reader_.read({above, 1}, before) && before.timed;
    // What is wrong with the row above is not the last line's fault.
    const bool sound_before = !silence_.problems().any_error();
    if (!reader_.read({last, 2}, row) || !row.timed) return false;
    if (sound_before && silence_.problems().any_error()) return false;
    if (columns_.has_rain && !columns_.of_tips && row.missing && last.back() == columns_.separator)
        return false;
    const CsvColumn& column = columns_.first_time();
    if (!has_before || column.index + 1 < columns_.count) return true;
    const std::size_t length = last.size() - time_of(row).place;
    const std::size_t usual = above.size() - time_of(before).place;
    return length >= usual && time_of(row).value >= time_of(before).value;
}

}  // namespace

void drop_partial_line(std::string& text, const CsvColumns& columns, const CsvLayout& layout,
                       RecordOddities& oddities) {
    if (text.empty() || text.back() == '\n') return;
    const std::size_t begin = begin_of_line(text, text.size());
    const std::string_view all = text;
    CsvLines lines(all.substr(begin));
    lines.use_separator(columns.separator);
    CsvLine last;
    if (!lines.next(last)) return;
    last.number += static_cast<std::size_t>(std::count(all.begin(), all.end(), '\n'));
    if (last.number <= columns.line) return;
    if (LastLine(columns, layout).makes_row(line_above(all, begin, columns.separator), last.text))
        return;
    oddities.note(Oddity::partial_last_line, last, 1, "the last line is cut off and left out");
    text.resize(begin);
}

}  // namespace rainledger
