#pragma once

#include <optional>

// The runoff curve number (USDA NRCS, National Engineering Handbook, Part 630, chapter 10,
// "Estimation of direct runoff from storm rainfall").
//
//   S = 25400/CN - 254 (mm),  Ia = lambda S,  Q(P) = (P - Ia)^2/(P - Ia + S) for P > Ia, else 0
//
// CN curve number (-), S maximum retention (mm), lambda initial-abstraction ratio (-), Ia initial
// abstraction (mm), P cumulative rain and run-on (mm), Q cumulative runoff (mm).
namespace rainledger {

/// Antecedent runoff condition: I dry, II average (as tabulated), III wet.
enum class AntecedentCondition { I, II, III };

/// What the user gives for a curve-number surface.
struct CurveNumber {
    double number = 100.0;                       ///< 0 < CN <= 100, for condition II
    double initial_abstraction_ratio = 0.2;      ///< lambda, 0 to 1
    std::optional<double> tabulated_ratio = {};  ///< the ratio that the number was tabulated for
    AntecedentCondition antecedent = AntecedentCondition::II;
};

/// The retention curve that follows from a curve number: S and Ia in mm.
struct RetentionCurve {
    double retention_mm = 0.0;            ///< S
    double initial_abstraction_mm = 0.0;  ///< Ia
};

/// S of a curve number, mm; CN = 100 gives 0.
[[nodiscard]] double retention_mm(double curve_number);
/// The curve number of a retention, the inverse of retention_mm.
[[nodiscard]] double curve_number_of(double retention_mm);
/// The retention for lambda = 0.05 of a number tabulated for lambda = 0.2:
/// S005 = 1.33 S020^1.15 with S in inches (Hawkins, Jiang, Woodward, Hjelmfelt and Van Mullem 2002,
/// "Runoff curve number method: examination of the initial abstraction ratio"). In and out in mm.
[[nodiscard]] double retention_for_ratio_005_mm(double retention_for_ratio_020_mm);

/// The retention curve of `given` with `number` already converted to its antecedent condition:
/// applies the 0.05 conversion where tabulated_ratio is 0.2 and the ratio 0.05.
[[nodiscard]] RetentionCurve retention_curve(const CurveNumber& given, double converted_number);

/// Q at cumulative P >= 0, mm.
[[nodiscard]] double cumulative_runoff_mm(const RetentionCurve& curve, double P);
/// dQ/dP at cumulative P >= 0: the share of further rain that runs off.
[[nodiscard]] double runoff_slope(const RetentionCurve& curve, double P);
/// Depth at which runoff begins under any rain (Ia), and its time under constant rain, h; infinite
/// without rain.
[[nodiscard]] double runoff_start_time(const RetentionCurve& curve, double rain_mm_per_h);

/// What becomes of an increment of rain.
struct RunoffIncrement {
    double initial_abstraction_mm = 0.0;
    double infiltrated_mm = 0.0;  ///< continuing abstraction
    double excess_mm = 0.0;
};

/// The increment when cumulative P grows from `P` by `dP` >= 0; each part computed without
/// differences of totals.
[[nodiscard]] RunoffIncrement runoff_increment(const RetentionCurve& curve, double P, double dP);

}  // namespace rainledger
