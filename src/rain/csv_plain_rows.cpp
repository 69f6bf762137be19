#include "rain/csv_plain_rows.hpp"

#include <array>
#include <charconv>
#include <cstddef>
#include <limits>
#include <system_error>

namespace rainledger {
namespace {

constexpr std::size_t kMostColumns = 3;

/// Which column fills which number of a row.
struct Slots {
    std::array<double PlainRow::*, kMostColumns> of_column{};
    std::size_t count = 0;
};

/// The slots of a file whose every column is used and holds numbers; count 0 for any other.
Slots plain_slots(const CsvColumns& columns) {
    const std::size_t used = 1U + (columns.start ? 1U : 0U) + (columns.end ? 1U : 0U);
    Slots slots;
    if (columns.stamped || used != columns.count) return slots;
    slots.count = used;
    if (columns.start) slots.of_column[columns.start->index] = &PlainRow::start;
    if (columns.end) slots.of_column[columns.end->index] = &PlainRow::end;
    slots.of_column[columns.rain.index] = &PlainRow::rain;
    return slots;
}

/// Reads one row; the place behind its line end, or null when it is no plain row.
const char* read_plain_row(const Slots& slots, char separator, const char* at, const char* end,
                           PlainRow& row) {
    for (std::size_t i = 0; i < slots.count; ++i) {
        const auto [stop, error] = std::from_chars(at, end, row.*slots.of_column[i]);
        if (error != std::errc{} || stop == end) return nullptr;
        at = stop + 1;
        if (i + 1 < slots.count) {
            if (*stop != separator) return nullptr;
        } else if (*stop == '\r' && at != end && *at == '\n') {
            ++at;
        } else if (*stop != '\n') {
            return nullptr;
        }
    }
    return at;
}

}  // namespace

void add_plain_rows(const CsvColumns& columns, const CsvRowReader& reader, CsvLines& lines,
                    CsvStepMaker& maker) {
    const Slots slots = plain_slots(columns);
    if (slots.count == 0 || !reader.uses_decimal_points()) return;
    const double missing =
        reader.missing_number().value_or(std::numeric_limits<double>::quiet_NaN());
    const char* const end = lines.end();
    PlainRow row;
    while (const char* const behind =
               read_plain_row(slots, columns.separator, lines.position(), end, row)) {
        if (row.rain == missing || !maker.add_plain(row)) return;
        lines.pass_line(behind);
    }
}

}  // namespace rainledger
