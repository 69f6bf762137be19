#include "chart/time_axis.hpp"

#include <algorithm>
#include <array>
#include <chrono>
#include <cmath>
#include <cstddef>
#include <cstdint>
#include <string_view>

#include <fmt/core.h>

namespace rainledger {
namespace {

namespace chrono = std::chrono;

constexpr double kSecondsPerHour = 3600.0;
constexpr std::int64_t kMinute = 60;
constexpr std::int64_t kHour = 60 * kMinute;
constexpr std::int64_t kDay = 24 * kHour;
constexpr std::int64_t kMsPerSecond = 1000;
constexpr double kMostSeconds = 1e15;  // beyond them seconds are no whole numbers: no ticks
constexpr double kRoom = 1e-6;         // of a second, for edges that carry a rounding

// Distances between ticks that people read easily, in seconds.
constexpr std::array<std::int64_t, 21> kDistances{
    1,        2,           5,           10,           15,           30,
    kMinute,  2 * kMinute, 5 * kMinute, 10 * kMinute, 15 * kMinute, 30 * kMinute,
    kHour,    2 * kHour,   3 * kHour,   6 * kHour,    12 * kHour,   kDay,
    2 * kDay, 5 * kDay,    10 * kDay};

constexpr std::array<std::string_view, 12> kMonthNames{"Jan", "Feb", "Mar", "Apr", "May", "Jun",
                                                       "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"};

/// The least distance that gives at most `most` ticks; beyond the table, whole tens of days.
std::int64_t tick_distance(double span_s, int most) {
    if (span_s > kMostSeconds) return 10 * kDay;
    for (const std::int64_t distance : kDistances)
        if (span_s / static_cast<double>(distance) <= most) return distance;
    const double tens = std::ceil(span_s / most / static_cast<double>(10 * kDay));
    return static_cast<std::int64_t>(tens) * 10 * kDay;
}

std::string number(double value) {
    return fmt::format("{:.4g}", value);
}

std::string elapsed_label(std::int64_t seconds, std::int64_t distance) {
    const auto value = static_cast<double>(seconds);
    if (distance >= kDay) return number(value / static_cast<double>(kDay));
    if (distance >= kHour) return number(value / kSecondsPerHour);
    if (distance < kMinute) return number(value / static_cast<double>(kMinute));
    return fmt::format("{}{}:{:02}", seconds < 0 ? "-" : "", std::abs(seconds) / kHour,
                       std::abs(seconds) % kHour / kMinute);
}

std::string_view elapsed_unit(std::int64_t distance) {
    if (distance >= kDay) return "d";
    if (distance >= kHour) return "h";
    return distance < kMinute ? "min" : "h:min";
}

/// Calls `take(value, at_h)` for every multiple of `distance` (s) that lies between `first_s` and
/// `span_h` later.
template <class Take>
void for_each_tick(double first_s, double span_h, std::int64_t distance, const Take& take) {
    const auto step = static_cast<double>(distance);
    const double last_s = first_s + span_h * kSecondsPerHour;
    if (std::max(std::abs(first_s), std::abs(last_s)) > kMostSeconds) return;
    for (double at = std::ceil((first_s - kRoom) / step) * step; at <= last_s + kRoom; at += step)
        take(static_cast<std::int64_t>(std::llround(at)), (at - first_s) / kSecondsPerHour);
}

TimeAxis elapsed_axis(double first_h, double span_h, int most_ticks, std::string_view title) {
    const double first_s = first_h * kSecondsPerHour;
    const std::int64_t distance = tick_distance(span_h * kSecondsPerHour, most_ticks);
    TimeAxis axis{span_h, {}, fmt::format("{} [{}]", title, elapsed_unit(distance))};
    for_each_tick(first_s, span_h, distance, [&](std::int64_t seconds, double at_h) {
        axis.ticks.push_back({at_h, elapsed_label(seconds, distance)});
    });
    return axis;
}

/// Seconds of the clock's face at an edge of stamped rain.
std::int64_t face_s(const StampedEdges& stamps, std::size_t edge) {
    const std::int64_t offset = stamps.has_offset ? stamps.offset_minutes[edge] : 0;
    return stamps.unix_ms[edge] / kMsPerSecond + offset * kMinute;
}

std::string day_words(std::int64_t face, bool with_year) {
    const chrono::year_month_day day{
        chrono::floor<chrono::days>(chrono::sys_seconds{chrono::seconds{face}})};
    std::string out = fmt::format("{} {}", static_cast<unsigned>(day.day()),
                                  kMonthNames[static_cast<unsigned>(day.month()) - 1]);
    return with_year ? fmt::format("{} {}", out, static_cast<int>(day.year())) : out;
}

std::string clock_label(std::int64_t face, std::int64_t distance) {
    const std::int64_t of_day = ((face % kDay) + kDay) % kDay;
    if (of_day == 0) return day_words(face, false);
    if (distance >= kMinute)
        return fmt::format("{:02}:{:02}", of_day / kHour, of_day % kHour / kMinute);
    return fmt::format("{:02}:{:02}:{:02}", of_day / kHour, of_day % kHour / kMinute,
                       of_day % kMinute);
}

std::string clock_title(const StampedEdges& stamps) {
    const std::int64_t first = face_s(stamps, 0);
    const std::int64_t last = face_s(stamps, stamps.unix_ms.size() - 1) - 1;
    std::string out = "clock time, " + day_words(first, true);
    if (day_words(last, true) != day_words(first, true)) out += " to " + day_words(last, true);
    if (!stamps.has_offset) return out;
    const int offset = stamps.offset_minutes.front();
    if (stamps.offset_minutes.back() != offset) return out + ", clock changed";
    if (offset == 0) return out + " (UTC)";
    return out + fmt::format(" (UTC{}{:02}:{:02})", offset < 0 ? "-" : "+", std::abs(offset) / 60,
                             std::abs(offset) % 60);
}

/// Ticks stand at round readings of the first edge's clock. Where the clock is changed during the
/// storm, the labels from there on are the new clock's.
TimeAxis clock_axis(const Hyetograph& rain, int most_ticks) {
    const StampedEdges& stamps = *rain.stamps;
    const double span = span_h(rain);
    const std::int64_t distance = tick_distance(span * kSecondsPerHour, most_ticks);
    const auto first_ms = static_cast<double>(stamps.unix_ms.front() % kMsPerSecond);
    const std::int64_t first = face_s(stamps, 0);
    TimeAxis axis{span, {}, clock_title(stamps)};
    std::size_t edge = 0;
    for_each_tick(static_cast<double>(first) + first_ms / 1000.0, span, distance,
                  [&](std::int64_t seconds, double at_h) {
                      while (edge + 1 < stamps.unix_ms.size() &&
                             rain.edges_h[edge + 1] - rain.edges_h.front() <= at_h + kRoom)
                          ++edge;
                      const std::int64_t change =
                          stamps.has_offset
                              ? (stamps.offset_minutes[edge] - stamps.offset_minutes[0]) * kMinute
                              : 0;
                      axis.ticks.push_back({at_h, clock_label(seconds + change, distance)});
                  });
    return axis;
}

}  // namespace

TimeAxis time_axis(const Hyetograph& rain, int most_ticks) {
    if (rain.stamps) return clock_axis(rain, most_ticks);
    return elapsed_axis(rain.edges_h.front(), span_h(rain), most_ticks, "time");
}

TimeAxis shared_time_axis(double span_h, int most_ticks) {
    return elapsed_axis(0.0, span_h, most_ticks, "time from the start of each storm");
}

std::string span_words(double hours) {
    constexpr double kMinutesPerHour = 60.0;
    if (hours >= 96.0) return number(hours / 24.0) + " d";
    const double minutes = hours * kMinutesPerHour;
    const auto whole = static_cast<std::int64_t>(std::llround(minutes));
    if (hours < 2.0) return number(minutes) + " min";
    if (whole % 60 == 0) return fmt::format("{} h", whole / 60);
    return fmt::format("{} h {:02} min", whole / 60, whole % 60);
}

double span_h(const Hyetograph& rain) {
    return rain.edges_h.back() - rain.edges_h.front();
}

}  // namespace rainledger
