#include "fieldtest/residuals.hpp"

#include <algorithm>
#include <cmath>

namespace rainledger {
namespace {

constexpr double kExact = 1.0e-9;  // of the largest depth

}  // namespace

std::vector<DepthSpan> depth_spans(std::span<const InfiltrationTest> tests) {
    std::vector<DepthSpan> spans;
    for (const InfiltrationTest& test : tests)
        for (const TestReading& reading : test.readings) {
            if (errors_add_up(test.kind))
                spans.push_back({reading.start_h, reading.end_h, reading.interval_mm});
            else
                spans.push_back({test.from_h, reading.end_h, reading.depth_mm});
        }
    return spans;
}

DepthErrors depth_errors(std::span<const FittedReading> readings) {
    const double n = static_cast<double>(readings.size());
    double mean = 0.0;
    double residual_sum = 0.0;
    for (const FittedReading& reading : readings) {
        mean += reading.depth_mm / n;
        residual_sum += reading.residual_mm * reading.residual_mm;
    }
    double total = 0.0;
    for (const FittedReading& reading : readings)
        total += (reading.depth_mm - mean) * (reading.depth_mm - mean);
    const double share = total > 0.0 ? residual_sum / total : 0.0;
    return {std::sqrt(residual_sum / n), 1.0 - share};
}

std::optional<double> corrected_akaike(double residual_sum, double largest_mm, std::size_t readings,
                                       std::size_t parameters) {
    const double n = static_cast<double>(readings);
    const double q = static_cast<double>(parameters + 1);
    if (!(n - q - 1.0 > 0.0)) return std::nullopt;
    const double exact = kExact * largest_mm;
    const double variance = std::max(residual_sum / n, exact * exact);
    return n * std::log(variance) + 2.0 * q + 2.0 * q * (q + 1.0) / (n - q - 1.0);
}

std::optional<double> lag_one_correlation(std::span<const InfiltrationTest> tests,
                                          std::span<const DepthSpan> spans,
                                          std::span<const double> fitted_mm) {
    constexpr std::size_t kFewest = 3;
    double products = 0.0;
    double squares = 0.0;
    double largest_mm = 0.0;
    std::size_t i = 0;
    for (const InfiltrationTest& test : tests) {
        double before = 0.0;
        for (std::size_t j = 0; j < test.readings.size(); ++j, ++i) {
            const double residual = spans[i].depth_mm - fitted_mm[i];
            products += residual * before;
            squares += residual * residual;
            largest_mm = std::max(largest_mm, spans[i].depth_mm);
            before = residual;
        }
    }
    const double exact = kExact * largest_mm;
    if (spans.size() < kFewest || squares <= exact * exact * static_cast<double>(spans.size()))
        return std::nullopt;
    return products / squares;
}

}  // namespace rainledger
