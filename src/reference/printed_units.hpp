#pragma once

#include "rainledger/reference/published_value.hpp"

// The one place where printed units become canonical ones: a table writes the printed figures
// inside these.
namespace rainledger::printed {

inline constexpr double kMmPerCm = 10.0;
inline constexpr double kMmPerInch = 25.4;
inline constexpr double kMmPerFoot = 304.8;
inline constexpr double kMmPerHourPerMicrometreSecond = 3.6;
inline constexpr double kSecondsPerHour = 3600.0;

/// A figure alone, a figure with its range, a range alone, each times `unit`.
constexpr PublishedValue value(double figure, double unit = 1.0) {
    return {figure * unit, {}};
}
constexpr PublishedValue value(double figure, double low, double high, double unit) {
    return {figure * unit, ValueRange{low * unit, high * unit}};
}
constexpr PublishedValue range(double low, double high, double unit = 1.0) {
    return {{}, ValueRange{low * unit, high * unit}};
}

}  // namespace rainledger::printed
