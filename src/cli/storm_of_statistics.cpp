#include <algorithm>
#include <array>
#include <limits>
#include <string_view>
#include <utility>

#include "cli/storm_sources.hpp"
#include "rainledger/base/suggest.hpp"
#include "rainledger/rain/formula_fit.hpp"
#include "rainledger/reference/mass_curves.hpp"
#include "rainledger/scenario/storm_making.hpp"

// A table of rainfall statistics: as it stands, with formulas fitted to it, or as a design storm.
namespace rainledger {
namespace {

/// Options that ask for a design storm.
bool wants_design(const StormOptions& options) {
    return options.every_h || options.duration_h || options.return_period_yr || options.pattern ||
           options.peak_at || options.curve;
}

StormPattern pattern_of(const StormOptions& options) {
    return options.pattern.value_or(StormPattern::alternating_blocks);
}

std::string curve_problem(const StormOptions& options) {
    const bool needed = pattern_of(options) == StormPattern::mass_curve;
    if (options.curve && !needed) return "--curve goes with --pattern mass_curve";
    if (options.curve || !needed) return {};
    std::string names;
    for (const MassCurveEntry& entry : mass_curve_table())
        names.append(names.empty() ? "" : ", ").append(entry.name);
    return "--pattern mass_curve needs --curve NAME; known here: " + names;
}

/// What the design options lack or have too many of.
std::string design_problem(const StormOptions& options) {
    const StormPattern pattern = pattern_of(options);
    if (options.fit_formula)
        return "--fit-formula looks at the whole table; leave out the options of a design storm";
    if (pattern == StormPattern::keifer_chu)
        return "--pattern keifer_chu needs an intensity formula, and '" + options.input +
               "' is a table; --fit-formula fits one, to stand in a scenario under 'design:'";
    if (!options.duration_h) return "a design storm needs its duration, such as --duration '2 h'";
    if (!options.every_h) return "a design storm needs its step, such as --every '5 min'";
    if (options.peak_at && pattern == StormPattern::uniform)
        return "--peak-at does not go with --pattern uniform, which has no peak";
    if (options.peak_at && pattern == StormPattern::mass_curve)
        return "--peak-at does not go with --pattern mass_curve, whose curve has its own peak";
    return curve_problem(options);
}

/// The durations that a published curve was made for: "24 h", "up to 6 h", "over 24 h".
std::string made_for(const MassCurveEntry& curve) {
    if (curve.shortest_h == curve.longest_h) return duration_label(curve.longest_h);
    if (!(curve.longest_h < std::numeric_limits<double>::max()))
        return "over " + duration_label(curve.shortest_h);
    if (!(curve.shortest_h > 0.0)) return "up to " + duration_label(curve.longest_h);
    return duration_label(curve.shortest_h) + " to " + duration_label(curve.longest_h);
}

void take_curve(const StormOptions& options, DesignWish& wish, Diagnostics& diagnostics) {
    if (!options.curve) return;
    const MassCurveEntry& entry = *find_mass_curve(*options.curve);
    wish.curve.emplace(entry.points, BetweenPoints::linear);
    wish.curve_words = std::string(entry.title) + " (" + std::string(entry.source) + ")";
    if (wish.duration_h < entry.shortest_h || wish.duration_h > entry.longest_h)
        diagnostics.warning({options.input, 0, 0, {}},
                            "the curve " + std::string(entry.name) + " was made for storms of " +
                                made_for(entry) + ", not " + duration_label(wish.duration_h));
}

Gathered design_storm(const StormOptions& options, RainfallStatistics statistics,
                      std::string read_as, Diagnostics& diagnostics) {
    if (std::string problem = design_problem(options); !problem.empty())
        return {std::nullopt, std::move(problem)};
    DesignWish wish;
    wish.pattern = pattern_of(options);
    wish.duration_h = *options.duration_h;
    wish.every_h = *options.every_h;
    wish.peak_at = options.peak_at;
    wish.return_period_yr = options.return_period_yr;
    wish.depth = std::move(statistics);
    wish.depth_words = options.input;
    take_curve(options, wish, diagnostics);
    MadeStorm made = storm_of_design(wish);
    if (!made.storm)
        return {std::nullopt, made.problem + (made.hint.empty() ? "" : "; " + made.hint)};
    for (const std::string& warning : made.warnings)
        diagnostics.warning({options.input, 0, 0, {}}, warning);
    Scenario scenario;
    scenario.title = "Design storm from " + options.input;
    made.storm->file = options.input;
    scenario.storms.push_back(*std::move(made.storm));
    return {StormFindings{std::move(read_as), std::move(scenario)}, {}};
}

/// Both forms fitted to one column, the better one first.
ColumnFit fit_column(const RainfallStatistics& statistics, std::optional<double> return_period_yr) {
    ColumnFit column{return_period_yr, *depths_of(statistics, return_period_yr).list, {}};
    for (const FormulaForm form : {FormulaForm::free_m, FormulaForm::free_n})
        column.fits.push_back(fit_formula(column.list, form));
    std::ranges::stable_sort(column.fits, {}, [](const FitAnswer& answer) {
        return answer.fit ? answer.fit->rms_log_residual : std::numeric_limits<double>::infinity();
    });
    return column;
}

std::vector<ColumnFit> fit_columns(const RainfallStatistics& statistics) {
    if (statistics.return_period_yr.empty()) return {fit_column(statistics, std::nullopt)};
    std::vector<ColumnFit> fits;
    for (const double years : statistics.return_period_yr)
        fits.push_back(fit_column(statistics, years));
    return fits;
}

}  // namespace

Gathered storms_of_statistics(const StormOptions& options, StormInput input,
                              Diagnostics& diagnostics) {
    auto statistics =
        read_rainfall_statistics_csv(options.input, std::move(input.text), diagnostics);
    if (!statistics) return {};
    std::string read_as = "a table of rainfall statistics: " + input.why;
    if (wants_design(options))
        return design_storm(options, *std::move(statistics), std::move(read_as), diagnostics);
    ShownTable shown{"Rainfall statistics of " + options.input, *std::move(statistics), {}};
    if (options.fit_formula) shown.fits = fit_columns(shown.statistics);
    return {StormFindings{std::move(read_as), std::move(shown)}, {}};
}

}  // namespace rainledger
