#include "rain/csv_rows.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <system_error>
#include <utility>

#include "rain/stamp_advice.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

bool same_word(std::string_view text, std::string_view lower_word) {
    return std::equal(
        text.begin(), text.end(), lower_word.begin(), lower_word.end(),
        [](char a, char b) { return (a >= 'A' && a <= 'Z' ? a - 'A' + 'a' : a) == b; });
}

bool looks_like_number(std::string_view text) {
    return !text.empty() && text.front() >= '0' && text.front() <= '9';
}

}  // namespace

CsvRowReader::CsvRowReader(const CsvColumns& columns, const CsvLayout& layout,
                           std::optional<Zone>& zone, CsvProblems& problems)
    : columns_(columns),
      layout_(layout),
      zone_(zone),
      problems_(problems),
      roles_(columns.count, Role::ignored),
      decimal_mark_(columns.separator == ',' ? '.' : '\0') {
    if (columns.start) roles_[columns.start->index] = Role::start;
    if (columns.end) roles_[columns.end->index] = Role::end;
    if (columns.has_rain) roles_[columns.rain.index] = Role::rain;
    if (layout.missing) missing_number_ = parse_number(*layout.missing);
}

bool CsvRowReader::read(const CsvLine& line, CsvRow& row) {
    row = CsvRow{};
    row.line = line.number;
    row.timed = true;
    const char* at = line.text.data();
    const char* const end = at + line.text.size();
    for (std::size_t i = 0; i < columns_.count; ++i) {
        if (i > 0) {
            if (at == end) {
                report_cell_count(line, at, i);
                return false;
            }
            ++at;
        }
        read_cell(roles_[i], line, at, row);
        if (header_lacks_unit_) return false;
    }
    if (at != end) {
        report_cell_count(line, at, columns_.count);
        return false;
    }
    if (columns_.stamped && row.timed) {
        if (columns_.start) row.timed = place_stamp(Role::start, line, row.start);
        if (columns_.end) row.timed = place_stamp(Role::end, line, row.end) && row.timed;
    }
    first_row_ = false;
    return true;
}

void CsvRowReader::read_cell(Role role, const CsvLine& line, const char*& at, CsvRow& row) {
    const bool is_number = role == Role::rain || (role != Role::ignored && !columns_.stamped);
    double value = 0.0;
    const char* const begin = at;
    if (is_number && read_plain_number(at, line, value)) {
        const std::size_t place = line.column_of(begin);
        if (role == Role::rain) {
            row.rain_place = place;
            take_rain(value, line, row);
        } else {
            (role == Role::start ? row.start : row.end) = {value, 0, false, place};
        }
        return;
    }
    const CsvCell cell =
        cut_cell(at, line.text.data() + line.text.size(), columns_.separator, buffer_);
    if (cell.form != CellForm::sound) {
        report_form(problems_, line, cell);
        if (role != Role::rain) row.timed = false;
    } else if (role == Role::rain) {
        read_rain(line, cell, row);
    } else if (role != Role::ignored) {
        read_time(role, line, cell, row);
    }
}

/// The usual cell, a bare number up to the separator, without cutting it out first. Anything else
/// is left where it is.
bool CsvRowReader::read_plain_number(const char*& at, const CsvLine& line, double& value) {
    const char* const end = line.text.data() + line.text.size();
    const auto [stop, error] = std::from_chars(at, end, value);
    if (error != std::errc{} || (stop != end && *stop != columns_.separator)) return false;
    if (!std::isfinite(value)) return false;
    if (decimal_mark_ != '.' && std::find(at, stop, '.') != stop) return false;
    at = stop;
    return true;
}

void CsvRowReader::read_rain(const CsvLine& line, const CsvCell& cell, CsvRow& row) {
    row.rain_place = line.column_of(cell.begin);
    if (marks_missing(cell.text)) {
        row.missing = true;
        if (layout_.gaps_are_dry) return;
        problems_.error(line.number, row.rain_place,
                        cell.text.empty() ? "the rain is missing here"
                                          : "the rain is missing here, marked " + shown(cell.text),
                        "write the value, or take gaps as no rain with gaps: dry in the scenario");
        return;
    }
    if (const auto value = read_number(Role::rain, cell.text, line, row.rain_place))
        take_rain(*value, line, row);
}

void CsvRowReader::take_rain(double value, const CsvLine& line, CsvRow& row) {
    if (missing_number_ && value == *missing_number_) {
        row.missing = true;
        if (!layout_.gaps_are_dry)
            problems_.error(line.number, row.rain_place,
                            "the rain is missing here, marked " + shown(*layout_.missing),
                            "write the value, or take gaps as no rain with gaps: dry in the "
                            "scenario");
    } else if (value < 0.0 && columns_.of_tips) {
        problems_.error(line.number, row.rain_place, "a count of tips cannot be negative",
                        "if " + shortest(value) + " marks a missing value, state missing: " +
                            shortest(value) + " in the scenario");
    } else if (value < 0.0) {
        problems_.error(line.number, row.rain_place, "rain cannot be negative",
                        "if " + shortest(value) + " marks a missing value, state missing: " +
                            shortest(value) + " in the scenario");
    } else {
        row.has_rain = true;
        row.rain = value;
    }
}

void CsvRowReader::read_time(Role role, const CsvLine& line, const CsvCell& cell, CsvRow& row) {
    RowTime& time = role == Role::start ? row.start : row.end;
    time.place = line.column_of(cell.begin);
    if (cell.text.empty()) {
        problems_.error(line.number, time.place, "the time is missing here",
                        "every row needs its time");
        row.timed = false;
    } else if (columns_.stamped) {
        if (!read_reading(role, line, cell)) row.timed = false;
    } else if (const auto value = read_number(role, cell.text, line, time.place)) {
        time.value = *value;
    } else {
        row.timed = false;
    }
}

bool CsvRowReader::read_reading(Role role, const CsvLine& line, const CsvCell& cell) {
    const std::size_t place = line.column_of(cell.begin);
    ParsedStamp stamp = parse_stamp(cell.text);
    if (stamp.value) {
        (role == Role::start ? start_reading_ : end_reading_) = *stamp.value;
        return check_offset(stamp.value->has_offset, line, place);
    }
    const CsvColumn& column = role == Role::start ? *columns_.start : *columns_.end;
    if (first_row_ && parse_number(cell.text)) {
        header_lacks_unit_ = true;
        if (columns_.of_tips) {
            problems_.error(line.number, place,
                            "column " + shown(column.title) + " holds numbers, not timestamps",
                            std::string(kTipsNeedStamps));
            return false;
        }
        problems_.error(columns_.line, column.place,
                        "column " + shown(column.title) + " has no unit, but holds numbers",
                        "write the unit of elapsed times in brackets, '" + column.title +
                            " [min]', or state time_unit: min in the scenario; only timestamps go "
                            "without");
    } else {
        problems_.error(line.number, place, std::move(stamp.problem),
                        stamp_advice(cell.text, column.title).value_or(std::move(stamp.hint)));
    }
    return false;
}

/// Without a zone, offsets must stand in every row or in none: nothing says what a stamp without
/// one means beside stamps with one.
bool CsvRowReader::check_offset(bool written, const CsvLine& line, std::size_t place) {
    const Offsets offsets = written ? Offsets::written : Offsets::absent;
    if (offsets_ == Offsets::unknown) offsets_ = offsets;
    if (offsets_ == offsets || zone_) return true;
    problems_.error(line.number, place,
                    written ? "this timestamp has a UTC offset, unlike those above"
                            : "this timestamp has no UTC offset, unlike those above",
                    "write the offset in every row or in none, or state zone: in the scenario");
    return false;
}

bool CsvRowReader::place_stamp(Role role, const CsvLine& line, RowTime& time) {
    const ClockReading& reading = role == Role::start ? start_reading_ : end_reading_;
    std::int64_t unix_ms = reading.unix_ms();
    if (zone_ && !reading.has_offset) {
        // A row may start at the very instant at which the row before it ends, and two tips may
        // fall at one.
        const bool may_touch = role == Role::start && (columns_.end || columns_.of_tips);
        std::optional<std::int64_t> not_before = stamp_before_;
        if (not_before && !may_touch) ++*not_before;
        const auto instant = zone_->instant(reading.face_ms, not_before);
        if (!instant) {
            problems_.error(line.number, time.place,
                            "clocks in " + *layout_.zone + " skip this time when they go forward",
                            "write the timestamps with their UTC offsets, or state the zone that "
                            "the logger's clock keeps");
            return false;
        }
        unix_ms = *instant;
    }
    stamp_before_ = unix_ms;
    time.value = static_cast<double>(unix_ms);
    time.offset_minutes = zone_ ? zone_->offset_minutes(unix_ms) : reading.offset_minutes;
    time.has_offset = zone_ || reading.has_offset;
    return true;
}

std::optional<double> CsvRowReader::read_number(Role role, std::string_view text,
                                                const CsvLine& line, std::size_t place) {
    const bool may_have_comma = columns_.separator != ',';
    const std::size_t comma = may_have_comma ? text.find(',') : std::string_view::npos;
    const bool has_point = text.find('.') != std::string_view::npos;
    std::optional<double> value;
    if (comma == std::string_view::npos) {
        value = parse_number(text);
    } else if (!has_point) {
        decimal_ = text;
        decimal_[comma] = '.';
        value = parse_number(decimal_);
    }
    if (!value) {
        report_no_number(role, text, line, place);
        return std::nullopt;
    }
    if (comma != std::string_view::npos && !note_decimal_mark(',', line, place))
        return std::nullopt;
    if (has_point && !note_decimal_mark('.', line, place)) return std::nullopt;
    return value;
}

/// A file that writes both 1.234 and 0,5 may mean a thousand by its point.
bool CsvRowReader::note_decimal_mark(char mark, const CsvLine& line, std::size_t place) {
    if (decimal_mark_ == '\0') decimal_mark_ = mark;
    if (decimal_mark_ == mark) return true;
    problems_.error(line.number, place,
                    mark == ',' ? "a decimal comma here, but decimal points above"
                                : "a decimal point here, but decimal commas above",
                    "write all numbers with the same decimal mark, and none for thousands");
    return false;
}

void CsvRowReader::report_no_number(Role role, std::string_view text, const CsvLine& line,
                                    std::size_t place) {
    double value = 0.0;
    const auto [stop, error] = std::from_chars(text.data(), text.data() + text.size(), value);
    const bool whole = stop == text.data() + text.size();
    if (whole && error != std::errc::invalid_argument) {
        problems_.error(line.number, place, shown(text) + " is not a finite number");
        return;
    }
    problems_.error(line.number, place, shown(text) + " is not a number",
                    number_advice(role, text));
}

std::string CsvRowReader::number_advice(Role role, std::string_view text) const {
    if (parse_stamp(text).value) return "timestamps take no unit in the header";
    if (role != Role::rain)
        if (auto advice = elapsed_advice(text, columns_.time_unit)) return *std::move(advice);
    if (!looks_like_number(text)) return {};
    const bool grouped =
        text.find(',') != std::string_view::npos || text.find('.') != text.rfind('.');
    return grouped ? "write a plain number such as 1234.5, without marks for thousands"
                   : "write a plain number such as 12.5; the unit stands in the header";
}

void CsvRowReader::report_cell_count(const CsvLine& line, const char* at, std::size_t seen) {
    std::size_t count = seen;
    const char* const end = line.text.data() + line.text.size();
    const char* const odd = at;
    while (at != end) {
        ++at;
        static_cast<void>(cut_cell(at, end, columns_.separator, buffer_));
        ++count;
    }
    std::string hint = "remove what is behind the last cell, or name its column in the header";
    if (count < columns_.count)
        hint = "write every cell, or begin the line with # if it is a note";
    else if (columns_.separator == ',')
        hint = "with decimal commas, separate the cells by semicolons or tabs";
    problems_.error(line.number, line.column_of(odd),
                    "this row has " + std::to_string(count) + (count == 1 ? " cell" : " cells") +
                        ", the header " + std::to_string(columns_.count),
                    std::move(hint));
    first_row_ = false;
}

bool CsvRowReader::marks_missing(std::string_view text) const {
    return text.empty() || same_word(text, "na") || same_word(text, "nan") ||
           (layout_.missing && text == *layout_.missing);
}

}  // namespace rainledger
