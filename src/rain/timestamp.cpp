#include "rainledger/rain/timestamp.hpp"

#include <chrono>
#include <exception>
#include <utility>

#include <date/date.h>
#include <date/tz.h>

#include "rainledger/base/cut.hpp"

namespace rainledger {
namespace {

using std::chrono::milliseconds;

constexpr std::int64_t kMsPerMinute = 60'000;
constexpr std::int64_t kMsPerDay = 86'400'000;
constexpr int kMostOffsetMinutes = 18 * 60;
// Two readings of one clock face are never further apart than a change of offset, which is a day at
// most (a place that moves across the date line).
constexpr std::int64_t kWidestChange_ms = 2 * kMsPerDay;

constexpr std::string_view kStampForm = "write 2026-03-04T10:05 or 2026-03-04 10:05:00+01:00";

/// Takes pieces off the front of a text.
struct Pieces {
    std::string_view rest;

    [[nodiscard]] bool take(char c) {
        if (rest.empty() || rest.front() != c) return false;
        rest.remove_prefix(1);
        return true;
    }

    /// A number of exactly `digits` digits, or -1.
    [[nodiscard]] int number(std::size_t digits) {
        if (rest.size() < digits) return -1;
        int value = 0;
        for (std::size_t i = 0; i < digits; ++i) {
            if (rest[i] < '0' || rest[i] > '9') return -1;
            value = 10 * value + (rest[i] - '0');
        }
        rest.remove_prefix(digits);
        return value;
    }
};

struct Fields {
    int year = 0, month = 0, day = 0;
    int hour = 0, minute = 0, second = 0, millisecond = 0;
    bool has_offset = false;
    int offset_sign = 1, offset_hour = 0, offset_minute = 0;
};

bool split_date(Pieces& pieces, Fields& f) {
    f.year = pieces.number(4);
    if (f.year < 0 || !pieces.take('-')) return false;
    f.month = pieces.number(2);
    if (f.month < 0 || !pieces.take('-')) return false;
    f.day = pieces.number(2);
    return f.day >= 0 && (pieces.take('T') || pieces.take(' '));
}

bool split_fraction(Pieces& pieces, Fields& f) {
    int weight = 100;
    for (; weight > 0; weight /= 10) {
        const int digit = pieces.number(1);
        if (digit < 0) break;
        f.millisecond += weight * digit;
    }
    return weight < 100;
}

bool split_time(Pieces& pieces, Fields& f) {
    f.hour = pieces.number(2);
    if (f.hour < 0 || !pieces.take(':')) return false;
    f.minute = pieces.number(2);
    if (f.minute < 0) return false;
    if (!pieces.take(':')) return true;
    f.second = pieces.number(2);
    if (f.second < 0) return false;
    return !pieces.take('.') || split_fraction(pieces, f);
}

bool split_offset(Pieces& pieces, Fields& f) {
    if (pieces.rest.empty()) return true;
    f.has_offset = true;
    if (pieces.take('Z')) return pieces.rest.empty();
    if (pieces.take('-'))
        f.offset_sign = -1;
    else if (!pieces.take('+'))
        return false;
    f.offset_hour = pieces.number(2);
    if (f.offset_hour < 0) return false;
    if (pieces.rest.empty()) return true;
    static_cast<void>(pieces.take(':'));
    f.offset_minute = pieces.number(2);
    return f.offset_minute >= 0 && pieces.rest.empty();
}

ParsedStamp refused(std::string problem, std::string hint = {}) {
    return {std::nullopt, std::move(problem), std::move(hint)};
}

std::string quoted(std::string_view text) {
    constexpr std::size_t kMostShown = 40;
    return in_quotes(text, kMostShown);
}

ParsedStamp impossible_date(std::string_view text, const Fields& f) {
    const auto month = date::year(f.year) / f.month;
    if (f.year == 0 || !month.ok())
        return refused(quoted(text) + " is no date of the calendar",
                       "a date is written year-month-day, 2026-03-04 for the fourth of March");
    const auto last = static_cast<unsigned>((month / date::last).day());
    return refused(quoted(text) + " is no date of the calendar",
                   "that month ends on day " + std::to_string(last));
}

bool is_time_of_day(const Fields& f) {
    if (f.hour == 24) return f.minute == 0 && f.second == 0 && f.millisecond == 0;
    return f.hour < 24 && f.minute < 60 && f.second < 60;
}

milliseconds to_ms(date::sys_time<milliseconds> time) {
    return time.time_since_epoch();
}

date::sys_seconds floor_seconds(std::int64_t ms) {
    return date::sys_seconds(date::floor<std::chrono::seconds>(milliseconds(ms)));
}

}  // namespace

ParsedStamp parse_stamp(std::string_view text) {
    Fields f;
    Pieces pieces{text};
    if (!split_date(pieces, f) || !split_time(pieces, f) || !split_offset(pieces, f))
        return refused(quoted(text) + " is not a timestamp", std::string(kStampForm));
    const date::year_month_day day(date::year(f.year), date::month(static_cast<unsigned>(f.month)),
                                   date::day(static_cast<unsigned>(f.day)));
    if (f.year == 0 || !day.ok()) return impossible_date(text, f);
    if (!is_time_of_day(f))
        return refused(quoted(text) + " is no time of the day",
                       "times run from 00:00:00 to 23:59:59.999, and 24:00 ends a day");
    const int offset = f.offset_sign * (60 * f.offset_hour + f.offset_minute);
    if (f.offset_minute > 59 || offset > kMostOffsetMinutes || offset < -kMostOffsetMinutes)
        return refused(quoted(text) + " has an impossible UTC offset",
                       "offsets run from -18:00 to +18:00");
    const std::int64_t minutes = std::int64_t{60} * f.hour + f.minute;
    const std::int64_t time_ms =
        minutes * kMsPerMinute + std::int64_t{1000} * f.second + f.millisecond;
    ClockReading reading;
    reading.face_ms = to_ms(date::sys_days(day)).count() + time_ms;
    reading.offset_minutes = static_cast<std::int16_t>(offset);
    reading.has_offset = f.has_offset;
    return {reading, {}, {}};
}

std::optional<Zone> Zone::find(const std::string& name) {
    try {
        return Zone(*date::locate_zone(name));
    } catch (const std::exception&) {  // the database's way of saying no
        return std::nullopt;
    }
}

const Zone::Stretch& Zone::stretch_at(std::int64_t unix_ms) {
    if (unix_ms < known_.begin_ms || unix_ms >= known_.end_ms) {
        const date::sys_info info = zone_->get_info(floor_seconds(unix_ms));
        known_ = {to_ms(info.begin).count(), to_ms(info.end).count(),
                  milliseconds(info.offset).count()};
    }
    return known_;
}

std::optional<std::int64_t> Zone::instant(std::int64_t face_ms,
                                          std::optional<std::int64_t> not_before_ms) {
    const Stretch& near = stretch_at(face_ms);
    const std::int64_t plain_ms = face_ms - near.offset_ms;
    const bool far_from_changes =
        plain_ms - near.begin_ms > kWidestChange_ms && near.end_ms - plain_ms > kWidestChange_ms;
    if (far_from_changes) return plain_ms;

    const date::local_seconds face(floor_seconds(face_ms).time_since_epoch());
    const date::local_info info = zone_->get_info(face);
    if (info.result == date::local_info::nonexistent) return std::nullopt;
    const std::int64_t first_ms = face_ms - milliseconds(info.first.offset).count();
    if (info.result == date::local_info::unique) return first_ms;
    if (!not_before_ms || first_ms >= *not_before_ms) return first_ms;
    return face_ms - milliseconds(info.second.offset).count();
}

std::int16_t Zone::offset_minutes(std::int64_t unix_ms) {
    return static_cast<std::int16_t>(stretch_at(unix_ms).offset_ms / kMsPerMinute);
}

}  // namespace rainledger
