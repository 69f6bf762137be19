#include "report/clock.hpp"

#include <algorithm>
#include <array>
#include <chrono>
#include <cmath>
#include <cstddef>
#include <cstdint>
#include <string_view>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;
constexpr double kMsPerHour = 3600.0e3;
constexpr std::int64_t kMsPerMinute = 60'000;
constexpr double kMostHours = 1.0e9;  // beyond it minutes say nothing

constexpr std::array<std::string_view, 12> kMonths{"Jan", "Feb", "Mar", "Apr", "May", "Jun",
                                                   "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"};

struct HoursAndMinutes {
    bool negative;
    std::int64_t hours;
    int minutes;
};

HoursAndMinutes to_the_minute(double hours) {
    const std::int64_t total = std::llround(hours * kMinutesPerHour);
    return {total < 0, std::abs(total) / 60, static_cast<int>(std::abs(total) % 60)};
}

/// The last edge at or before `instant`, or the first.
std::size_t edge_before(const StampedEdges& stamps, std::int64_t instant) {
    const auto after = std::upper_bound(stamps.unix_ms.begin(), stamps.unix_ms.end(), instant);
    const auto count = static_cast<std::size_t>(after - stamps.unix_ms.begin());
    return count > 0 ? count - 1 : 0;
}

std::int64_t instant_at(const Hyetograph& rain, double elapsed_h) {
    return rain.stamps->unix_ms.front() +
           std::llround((elapsed_h - rain.edges_h.front()) * kMsPerHour);
}

/// The clock face of an instant, as milliseconds since 1970-01-01 00:00 of that face.
std::chrono::milliseconds face_of(const StampedEdges& stamps, std::int64_t instant) {
    if (!stamps.has_offset) return std::chrono::milliseconds{instant};
    const std::int64_t offset = stamps.offset_minutes[edge_before(stamps, instant)];
    return std::chrono::milliseconds{instant + offset * kMsPerMinute};
}

}  // namespace

std::string duration_text(double hours) {
    if (std::abs(hours) >= kMostHours) return fixed(hours, 0) + " h";
    const HoursAndMinutes time = to_the_minute(hours);
    const std::string_view sign = time.negative ? "-" : "";
    if (time.hours == 0) return fmt::format("{}{} min", sign, time.minutes);
    return fmt::format("{}{} h {:02} min", sign, time.hours, time.minutes);
}

std::string elapsed_text(double hours) {
    if (std::abs(hours) >= kMostHours) return fixed(hours, 0) + ":00";
    const HoursAndMinutes time = to_the_minute(hours);
    return fmt::format("{}{}:{:02}", time.negative ? "-" : "", time.hours, time.minutes);
}

std::string face_text(std::chrono::milliseconds face, std::chrono::milliseconds first_face) {
    namespace chrono = std::chrono;
    const auto first_day = chrono::floor<chrono::days>(first_face);
    // Half a minute rounds up, as in the elapsed time beside it.
    const auto minute = chrono::floor<chrono::minutes>(face + chrono::seconds{30});
    const auto day = chrono::floor<chrono::days>(minute);
    const std::int64_t minute_of_day = (minute - day).count();
    const std::string clock = fmt::format("{:02}:{:02}", minute_of_day / 60, minute_of_day % 60);
    if (day == first_day) return clock;
    const chrono::year_month_day date{chrono::sys_days{day}};
    return fmt::format("{} {} {}", static_cast<unsigned>(date.day()),
                       kMonths[static_cast<unsigned>(date.month()) - 1], clock);
}

std::string clock_text(const Hyetograph& rain, double elapsed_h) {
    const StampedEdges& stamps = *rain.stamps;
    return face_text(face_of(stamps, instant_at(rain, elapsed_h)),
                     face_of(stamps, stamps.unix_ms.front()));
}

StampedEdges stamps_at(const Hyetograph& rain, std::span<const double> elapsed_h) {
    const StampedEdges& stamps = *rain.stamps;
    StampedEdges out;
    out.has_offset = stamps.has_offset;
    out.unix_ms.reserve(elapsed_h.size());
    out.offset_minutes.reserve(elapsed_h.size());
    for (const double elapsed : elapsed_h) {
        out.unix_ms.push_back(instant_at(rain, elapsed));
        out.offset_minutes.push_back(
            stamps.offset_minutes[edge_before(stamps, out.unix_ms.back())]);
    }
    return out;
}

}  // namespace rainledger
