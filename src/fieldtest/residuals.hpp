#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <vector>

#include "fieldtest/law_model.hpp"
#include "rainledger/fieldtest/law_fits.hpp"

// What is fitted of a test, and how good the fit is.
namespace rainledger {

/// The depths that are fitted: from the start of the depths to each reading, or from reading to
/// reading where errors add up. One per reading, test after test.
[[nodiscard]] std::vector<DepthSpan> depth_spans(std::span<const InfiltrationTest> tests);

struct DepthErrors {
    double rmse_mm = 0.0;
    double r_squared = 0.0;  ///< 1 for an exact fit
};
/// Of the cumulative depths.
[[nodiscard]] DepthErrors depth_errors(std::span<const FittedReading> readings);

/// n ln(sum/n) + 2 q + 2 q (q + 1)/(n - q - 1) with q = parameters + 1; nothing where n <= q + 1. A
/// fit to within 1e-9 of the largest depth counts as exact, so that the logarithm stays finite.
[[nodiscard]] std::optional<double> corrected_akaike(double residual_sum, double largest_mm,
                                                     std::size_t readings, std::size_t parameters);

/// Sum of the products of neighbouring residuals within each test over the sum of all squares;
/// nothing for an exact fit, or with fewer than three readings.
[[nodiscard]] std::optional<double> lag_one_correlation(std::span<const InfiltrationTest> tests,
                                                        std::span<const DepthSpan> spans,
                                                        std::span<const double> fitted_mm);

}  // namespace rainledger
