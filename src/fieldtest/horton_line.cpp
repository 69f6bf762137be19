#include "rainledger/fieldtest/horton_line.hpp"

#include <cmath>
#include <vector>

namespace rainledger {
namespace {

struct Point {
    double time_h;
    double log_rate;
};

/// Sums about the means of the points.
struct Sums {
    double n = 0.0;
    double time = 0.0;      // mean
    double log_rate = 0.0;  // mean
    double tt = 0.0;
    double tl = 0.0;
    double ll = 0.0;
};

Sums sums_of(const std::vector<Point>& points) {
    Sums sums;
    sums.n = static_cast<double>(points.size());
    for (const Point& point : points) {
        sums.time += point.time_h / sums.n;
        sums.log_rate += point.log_rate / sums.n;
    }
    for (const Point& point : points) {
        const double t = point.time_h - sums.time;
        const double l = point.log_rate - sums.log_rate;
        sums.tt += t * t;
        sums.tl += t * l;
        sums.ll += l * l;
    }
    return sums;
}

HortonLine line_of(const Sums& sums, double fc) {
    HortonLine line;
    const double slope = sums.tl / sums.tt;
    line.curve = {fc + std::exp(sums.log_rate - slope * sums.time), fc, -slope};
    line.used = static_cast<std::size_t>(sums.n);
    line.r_squared = sums.tl * sums.tl / (sums.tt * sums.ll);
    if (line.used < 3) return line;
    const double residual = std::max(0.0, sums.ll - slope * sums.tl);
    line.decay_standard_error_per_h = std::sqrt(residual / (sums.n - 2.0) / sums.tt);
    return line;
}

}  // namespace

HortonLineAnswer fit_horton_line(std::span<const TimedRate> rates, double fc) {
    std::vector<Point> points;
    for (const TimedRate& rate : rates)
        if (rate.rate_mm_per_h > fc)
            points.push_back({rate.time_h, std::log(rate.rate_mm_per_h - fc)});
    HortonLineAnswer answer;
    answer.left_out = rates.size() - points.size();
    if (points.size() < 2) {
        answer.problem = "fewer than two rates lie above the final capacity";
        return answer;
    }
    const Sums sums = sums_of(points);
    if (!(sums.tl < 0.0)) {
        answer.problem = "the rates do not fall with time";
        return answer;
    }
    answer.line = line_of(sums, fc);
    answer.line->left_out = answer.left_out;
    if (std::isfinite(answer.line->curve.initial_capacity_mm_per_h)) return answer;
    answer.line.reset();
    answer.problem = "the line's initial capacity is beyond all numbers";
    return answer;
}

HortonLineAnswer fit_horton_line(const InfiltrationTest& test, RatePlace place, double fc) {
    std::vector<TimedRate> rates;
    for (const TestReading& reading : test.readings)
        rates.push_back({place == RatePlace::interval_end ? reading.end_h : reading.middle_h,
                         reading.rate_mm_per_h});
    return fit_horton_line(rates, fc);
}

}  // namespace rainledger
