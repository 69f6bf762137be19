#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>

#include "rainledger/fieldtest/field_fit.hpp"
#include "rainledger/report/summary.hpp"

// What `rainledger fit` gives: for people, for programs, as a table and as a scenario's losses.
namespace rainledger {

/// The line that stands under every result of a field test.
inline constexpr std::string_view kFitCaution =
    "A field test describes a small area under ponded water; local codes and a licensed engineer "
    "decide.";

/// A fit with the words around it.
struct ShownFit {
    std::string title;
    std::string readings;  ///< the file of readings as named
    bool single_ring = false;
    FieldFit fit;
};

/// The summary: readings and rates, steady rate, the laws ranked with their parameters, 95 %
/// intervals and errors, Horton's straight line beside the nonlinear fit, several pits together and
/// their spread, warnings in words, design values where a design factor is given, and the cautions
/// of field tests.
[[nodiscard]] std::string fit_summary(const ShownFit& shown, const SummaryOptions& options);

/// JSON in mm and h: {"title", "program", "readings_file", "single_ring", "design_factor", "pits":
/// {NAME: {"laws": {...}, "ranking": [...], "straight_line": {...}, "steady": {...}, "readings":
/// [...], "warnings": [...]}}, "pooled": {"laws", "ranking", "spread", "warnings"} or null,
/// "warnings": [every one as a sentence], "caution"}; of a single pit the keys "laws", "ranking",
/// "straight_line" and "steady" stand at the top as well. A pit without a name is "pit"; a law that
/// could not be fitted is null.
[[nodiscard]] std::string fit_json(const ShownFit& shown, std::span<const std::string> warnings);

/// Readings, rates and the fitted value of each law, a row per pit and reading, in min and mm:
/// pit,reading,end_min,depth_mm,rate_mm_per_h, then per law NAME_depth_mm,NAME_rate_mm_per_h of the
/// pit's own fit and, with several pits, pooled_NAME_... of all together. Readings left out have no
/// row and keep their numbers. Cells of a law that could not be fitted are empty.
[[nodiscard]] std::string fit_csv(const ShownFit& shown);

/// The `losses:` block of a law as YAML that a scenario takes, with comments that say where it came
/// from, and a `draws:` block with the means and the covariance of the same parameters (in mm and
/// h, a parameter without error with rows of zeros); rates are divided by the design factor in
/// both. It is the best-ranked law that scenarios can hold unless one is named; pits fitted
/// together where there are several. Nothing, with `problem`, where that law was not fitted or
/// scenarios cannot hold it.
[[nodiscard]] std::optional<std::string> fit_yaml(const ShownFit& shown,
                                                  std::optional<FieldLaw> law,
                                                  std::string& problem);

}  // namespace rainledger
