#pragma once

#include <string>
#include <string_view>

// What a practitioner must know before using a fitted number.
namespace rainledger {

enum class FitCaution {
    not_identified,          ///< an interval spans zero or a decade, or there is none
    negative_steady_term,    ///< a steady term ended on 0; the free fit would be negative
    on_bound,                ///< another parameter ended on its bound
    final_above_last_rates,  ///< Horton's fc over 5 % above each of the last three rates
    shorter_than_decay,      ///< the test is shorter than 1/k
    correlated_residuals,    ///< lag-1 correlation above 0.5: the intervals are too narrow
    no_freedom,              ///< as many parameters as readings
    few_readings,            ///< fewer than two readings per parameter
    rising_rate,             ///< the fitted rate rises with time
    not_converged,           ///< the sum of squares is not stationary
    stopped_early,           ///< no convention finds the end of the test steady
    final_depends_on_end,    ///< Horton's fc moves by more than 10 % without the last readings
    noisy,                   ///< the readings scatter by over a quarter of an interval's depth
    no_fit,                  ///< a law could not be fitted
    pits_differ,             ///< the spread between pits exceeds the pooled fit's interval
};

/// The caution as a word: "not_identified".
[[nodiscard]] std::string_view fit_caution_key(FitCaution caution);

struct FitWarning {
    FitCaution caution = FitCaution::not_identified;
    std::string text;  ///< a sentence without full stop, which names its law
};

}  // namespace rainledger
