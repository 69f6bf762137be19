#include "rainledger/losses/curve_number.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace rainledger {
namespace {

constexpr double kMmPerInch = 25.4;

}  // namespace

double retention_mm(double curve_number) {
    return 25400.0 / curve_number - 254.0;
}

double curve_number_of(double retention) {
    return 25400.0 / (retention + 254.0);
}

double retention_for_ratio_005_mm(double retention_for_ratio_020) {
    return 1.33 * std::pow(retention_for_ratio_020 / kMmPerInch, 1.15) * kMmPerInch;
}

RetentionCurve retention_curve(const CurveNumber& given, double converted_number) {
    double retention = retention_mm(converted_number);
    if (given.tabulated_ratio == 0.2 && given.initial_abstraction_ratio == 0.05)
        retention = retention_for_ratio_005_mm(retention);
    return {retention, given.initial_abstraction_ratio * retention};
}

double cumulative_runoff_mm(const RetentionCurve& curve, double P) {
    const double x = P - curve.initial_abstraction_mm;
    return x > 0.0 ? x * x / (x + curve.retention_mm) : 0.0;
}

// With x = P - Ia, dQ/dP = 1 - (S/(x + S))^2 = x (x + 2 S)/(x + S)^2.
double runoff_slope(const RetentionCurve& curve, double P) {
    const double x = P - curve.initial_abstraction_mm;
    const double S = curve.retention_mm;
    if (S == 0.0) return x >= 0.0 ? 1.0 : 0.0;
    return x > 0.0 ? x / (x + S) * ((x + 2.0 * S) / (x + S)) : 0.0;
}

double runoff_start_time(const RetentionCurve& curve, double rain_mm_per_h) {
    if (!(rain_mm_per_h > 0.0)) return std::numeric_limits<double>::infinity();
    return curve.initial_abstraction_mm / rain_mm_per_h;
}

// With x = P - Ia, Q = x^2/(x + S) and x - Q = S x/(x + S); the differences between x0 and x1 are
// brought over one denominator so that nothing cancels.
RunoffIncrement runoff_increment(const RetentionCurve& curve, double P, double dP) {
    const double Ia = curve.initial_abstraction_mm;
    const double S = curve.retention_mm;
    RunoffIncrement out;
    out.initial_abstraction_mm = std::min(dP, std::max(0.0, Ia - P));
    const double dx = dP - out.initial_abstraction_mm;
    if (dx <= 0.0) return out;
    if (S == 0.0) {
        out.excess_mm = dx;
        return out;
    }
    const double x0 = std::max(0.0, P - Ia);
    const double x1 = x0 + dx;
    const double denominator = (x0 + S) * (x1 + S);
    const double scale = dx / denominator;
    out.infiltrated_mm = S * S * scale;
    out.excess_mm = (x0 * x1 + S * (x0 + x1)) * scale;
    return out;
}

}  // namespace rainledger
