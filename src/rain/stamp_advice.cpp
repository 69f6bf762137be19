#include "rain/stamp_advice.hpp"

#include <algorithm>
#include <array>
#include <vector>

#include "rain/csv_text.hpp"
#include "rainledger/rain/timestamp.hpp"

namespace rainledger {
namespace {

constexpr std::array<std::string_view, 4> kTotals{"total", "totals", "sum", "summe"};

bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

/// Takes the digits at the front of `rest`.
std::string_view take_digits(std::string_view& rest) {
    const auto* const stop = std::find_if_not(rest.begin(), rest.end(), is_digit);
    const std::string_view digits = rest.substr(0, static_cast<std::size_t>(stop - rest.begin()));
    rest.remove_prefix(digits.size());
    return digits;
}

std::string two_digits(std::string_view digits) {
    return (digits.size() < 2 ? "0" : "") + std::string(digits);
}

/// Takes "am" or "pm" off the end; 0 where neither stands there.
char take_half_of_day(std::string_view& text) {
    const std::string end = lower(text.substr(text.size() - std::min<std::size_t>(2, text.size())));
    if (end != "am" && end != "pm") return 0;
    text = trimmed(text.substr(0, text.size() - 2));
    return end.front();
}

/// "1:05 PM" as "13:05"; nothing for what is no time of the day.
std::optional<std::string> time_of_day(std::string_view text) {
    const char half = take_half_of_day(text);
    std::string_view rest = text;
    std::string hour = two_digits(take_digits(rest));
    if (hour.size() != 2 || !rest.starts_with(':')) return std::nullopt;
    if (half != 0) {
        const int number = 10 * (hour[0] - '0') + (hour[1] - '0');
        if (number < 1 || number > 12) return std::nullopt;
        hour = two_digits(std::to_string(number % 12 + (half == 'p' ? 12 : 0)));
    }
    std::string time = hour + std::string(rest);
    if (!parse_stamp("2026-03-04 " + time).value) return std::nullopt;
    return time;
}

/// A date in any order, cut into its three numbers.
struct LooseDate {
    std::array<std::string_view, 3> part;
    char mark = '/';
    std::string time;  ///< empty where there is none
};

std::optional<LooseDate> cut_date(std::string_view text) {
    LooseDate date;
    for (std::size_t i = 0; i < 3; ++i) {
        if (i > 0) {
            const bool known =
                text.starts_with('/') || text.starts_with('.') || text.starts_with('-');
            if (!known || (i == 2 && text.front() != date.mark)) return std::nullopt;
            date.mark = text.front();
            text.remove_prefix(1);
        }
        date.part[i] = take_digits(text);
        const std::size_t digits = date.part[i].size();
        if (digits != 1 && digits != 2 && (digits != 4 || i == 1)) return std::nullopt;
    }
    if (text.empty()) return date;
    if (text.front() == ',') text.remove_prefix(1);
    if (!text.starts_with(' ') && !text.starts_with('T')) return std::nullopt;
    auto time = time_of_day(trimmed(text.substr(1)));
    if (!time) return std::nullopt;
    date.time = *std::move(time);
    return date;
}

/// The date in every order in which it is one of the calendar.
std::vector<std::string> rewritten(const LooseDate& date) {
    const auto& [first, second, third] = date.part;
    std::vector<std::string> found;
    const auto try_order = [&](std::string_view year, std::string_view month,
                               std::string_view day) {
        std::string stamp = std::string(year) + "-" + two_digits(month) + "-" + two_digits(day) +
                            " " + (date.time.empty() ? "00:00" : date.time);
        const bool is_new = std::ranges::find(found, stamp) == found.end();
        if (is_new && parse_stamp(stamp).value) found.push_back(std::move(stamp));
    };
    if (first.size() == 4) {
        try_order(first, second, third);
    } else {
        try_order(third, second, first);
        // Points stand between day, month and year only.
        if (date.mark != '.') try_order(third, first, second);
    }
    return found;
}

}  // namespace

TimeShape time_shape(std::string_view text) {
    if (std::ranges::find(kTotals, lower(text)) != kTotals.end()) return TimeShape::total;
    if (time_of_day(text)) return TimeShape::time_of_day;
    return cut_date(text) ? TimeShape::date : TimeShape::other;
}

std::optional<std::string> stamp_advice(std::string_view text, std::string_view column) {
    const TimeShape shape = time_shape(text);
    if (shape == TimeShape::other) return std::nullopt;
    if (shape == TimeShape::total) return "remove the total row";
    if (shape == TimeShape::time_of_day)
        return "put the date in the same cell, such as 2026-03-04 " + *time_of_day(text) +
               ", or give minutes in a column '" + std::string(column) + " [min]'";
    const std::vector<std::string> stamps = rewritten(*cut_date(text));
    if (stamps.empty()) return std::nullopt;
    return "write year-month-day and the time of the day, " + stamps.front() +
           (stamps.size() > 1 ? " or " + stamps.back() : "");
}

std::optional<std::string> elapsed_advice(std::string_view text, std::string_view unit) {
    switch (time_shape(text)) {
        case TimeShape::total:
            return "remove the total row";
        case TimeShape::time_of_day:
            return "write elapsed time as a plain number in " + std::string(unit) +
                   ", not as hours:minutes";
        case TimeShape::date:
            return "timestamps take no unit in the header, and are written 2026-03-04 10:05";
        case TimeShape::other:
            break;
    }
    return std::nullopt;
}

}  // namespace rainledger
