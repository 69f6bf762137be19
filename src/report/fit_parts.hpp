#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/report/fit_report.hpp"
#include "report/display.hpp"

// Pieces of a field test's results that its texts share.
namespace rainledger {

inline constexpr std::size_t kFitWidth = 98;

/// A fitted parameter in words, and as a scenario has it.
struct ParameterWords {
    std::string_view key;                 ///< of ParameterEstimate
    std::string_view words;               ///< "initial capacity"
    std::optional<Dimension> dimension;   ///< none: a plain number
    std::string_view scenario_key;        ///< "initial_capacity"; empty where scenarios have none
    std::string_view scenario_unit = {};  ///< the canonical one, as a scenario writes it
};

/// The words of a key of ParameterEstimate.
[[nodiscard]] const ParameterWords& parameter_words(std::string_view key);

/// "initial capacity (mm/h)".
[[nodiscard]] std::string parameter_label(std::string_view key, const Display& display);

/// A value of that parameter in the units of `display`, to three figures and four decimals at
/// most; "unlimited" where it is.
[[nodiscard]] std::string parameter_number(std::string_view key, double value,
                                           const Display& display);

/// The name of a pit as a key: its own, or "pit".
[[nodiscard]] std::string_view pit_key(const InfiltrationTest& test);

/// Where a convention stands in outputs: "last_three_within_tenth".
[[nodiscard]] std::string_view steady_convention_key(SteadyConvention convention);

/// Laws with their ranking: of all pits together where there are several.
struct RankedFits {
    const std::vector<LawFitAnswer>& laws;
    const std::vector<RankedLaw>& ranking;
};
[[nodiscard]] RankedFits site_fits(const FieldFit& fit);

/// All readings of all pits.
[[nodiscard]] std::size_t reading_count(const FieldFit& fit);

/// The laws that rank first in the pits, each fitted alone: "Horton in 2 of 3, Philip in 1 of 3".
[[nodiscard]] std::string best_alone_words(const FieldFit& fit);

/// The warnings of laws in the order of their ranking.
[[nodiscard]] std::vector<FitWarning> ranked_warnings(const RankedFits& fits);

/// Every warning, of tests and laws, a sentence each that begins with its pit where there are
/// several; those of all pits together last.
[[nodiscard]] std::vector<std::string> all_fit_warnings(const FieldFit& fit);

}  // namespace rainledger
