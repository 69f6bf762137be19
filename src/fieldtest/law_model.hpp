#pragma once

#include <array>
#include <cstddef>
#include <span>
#include <vector>

#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/fieldtest/least_squares.hpp"

// The laws as the fit sees them: in parameters of its own, in which every bound is a plain number
// and every bound can be reached.
//
//   Horton               d = f0 - fc, fc, k (in this order, so that a constant capacity is d = 0)
//   Green and Ampt       K, B = 2 K S: at K = 0 what is left is F = sqrt(B t)
//   Philip               Sp, A
//   Kostiakov            a, b
//   modified Kostiakov   a, b, c
namespace rainledger {

inline constexpr std::size_t kMostLawParameters = 3;
using LawSlopes = std::array<double, kMostLawParameters>;

/// Depth infiltrated between two times.
struct DepthSpan {
    double from_h = 0.0;
    double to_h = 0.0;
    double depth_mm = 0.0;
};

[[nodiscard]] std::size_t law_parameter_count(FieldLaw law);
/// F at `time_h` > 0.
[[nodiscard]] double law_depth(FieldLaw law, std::span<const double> own, double time_h);
/// f at `time_h` >= 0; infinite where unlimited.
[[nodiscard]] double law_rate(FieldLaw law, std::span<const double> own, double time_h);
/// dF by each own parameter at `time_h` > 0.
[[nodiscard]] LawSlopes law_slopes(FieldLaw law, std::span<const double> own, double time_h);

/// F between two times.
[[nodiscard]] double law_growth(FieldLaw law, std::span<const double> own, double from_h,
                                double to_h);

[[nodiscard]] std::vector<ParameterRange> law_ranges(FieldLaw law,
                                                     std::span<const DepthSpan> spans);
/// Starts for a fit, from the data: the laws are linear in all parameters but one, so that one runs
/// through a grid with the others solved for, and the best grid points are taken.
[[nodiscard]] std::vector<std::vector<double>> law_starts(FieldLaw law,
                                                          std::span<const DepthSpan> spans);

/// A reported parameter: its value and its derivatives by the law's own parameters.
struct ReportedParameter {
    std::string_view key;
    double value = 0.0;
    EstimateKind kind = EstimateKind::fitted;
    LawSlopes by_own{};
    bool scales_with_rate = true;  ///< divides by the design factor as the rates do
};
[[nodiscard]] std::vector<ReportedParameter> reported_parameters(
    FieldLaw law, std::span<const double> own, std::span<const Standing> standing);

}  // namespace rainledger
