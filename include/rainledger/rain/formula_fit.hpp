#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/rain/depth_duration.hpp"

// Fitting an intensity formula to tabulated depths.
namespace rainledger {

/// Which exponent of i = a / (t^m + b)^n is free; the other is 1.
enum class FormulaForm { free_m, free_n };

/// A formula fitted by least squares on log intensity, t in minutes.
struct FormulaFit {
    FormulaForm form = FormulaForm::free_m;
    IntensityFormula formula;
    std::vector<double> residual;   ///< per duration: fitted over tabulated intensity, less 1
    double rms_log_residual = 0.0;  ///< root mean square of the log residuals
};

/// The fit, or why there is none.
struct FitAnswer {
    std::optional<FormulaFit> fit;
    std::string problem;
};

/// Fits one form to a list of at least four depths. The fitted formula is positive, and its depth
/// does not fall, over the list's durations.
[[nodiscard]] FitAnswer fit_formula(const DepthList& list, FormulaForm form);

}  // namespace rainledger
