#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "rainledger/fieldtest/fit_warning.hpp"
#include "rainledger/fieldtest/horton_line.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/fieldtest/readings.hpp"
#include "rainledger/fieldtest/steady_rate.hpp"

// Everything that is made of one field test: per pit, and for all pits of a site together.
namespace rainledger {

/// Where Horton's fc comes from in the nonlinear fit.
enum class SteadyUse {
    fitted,  ///< fitted with the other parameters
    fixed,   ///< given
    tail,    ///< the test's own steady rate
};

struct FieldFitOptions {
    std::vector<FieldLaw> laws{kFieldLaws.begin(), kFieldLaws.end()};
    SteadyUse steady_use = SteadyUse::fitted;
    double fixed_rate_mm_per_h = 0.0;  ///< for SteadyUse::fixed, >= 0
    double ignore_first_h = 0.0;       ///< >= 0; see without_first
    double design_factor = 1.0;        ///< >= 1; divides every rate for design
};

/// How the straight line differs from the nonlinear fit: line less fit.
struct LineBias {
    double initial_capacity_mm_per_h = 0.0;
    double final_capacity_mm_per_h = 0.0;
    double decay_per_h = 0.0;
    double rmse_mm = 0.0;  ///< on cumulative depth
};

/// The classical straight line, on ends or middles of the intervals.
struct LineFit {
    RatePlace place = RatePlace::interval_end;
    HortonLineAnswer answer;
    std::optional<double> rmse_mm = {};  ///< of the line's curve, on cumulative depth
    std::optional<LineBias> bias = {};   ///< where Horton was fitted too
};

/// How far Horton's fc hangs on the end of the test: the fit without its last quarter of readings.
struct FinalWithoutEnd {
    std::size_t left_out = 0;
    double with_mm_per_h = 0.0;
    double without_mm_per_h = 0.0;
};

/// One pit.
struct TestFit {
    InfiltrationTest test;  ///< as fitted, its first readings left out where asked
    std::size_t ignored_readings = 0;
    std::vector<SteadyRate> steady;  ///< one per convention, in the order of kSteadyConventions
    std::size_t tail = 0;            ///< which of them gives the tail: the first that is steady
    std::vector<LineFit> lines;      ///< on ends, on middles
    std::vector<LawFitAnswer> laws;  ///< in the order asked
    std::vector<RankedLaw> ranking;
    std::optional<FinalWithoutEnd> final_without_end = {};
    std::vector<FitWarning> warnings;  ///< of the test; those of a law stand with its fit

    [[nodiscard]] const SteadyRate& tail_rate() const { return steady[tail]; }
};

/// A parameter over the pits. Statistics are of the pits in which it was fitted, with a sample
/// deviation; the spread, not the pooled fit's interval, is the uncertainty of a site.
struct PitSpread {
    FieldLaw law = FieldLaw::horton;
    std::string_view key;
    std::vector<std::optional<double>> values;  ///< one per pit
    double mean = 0.0;
    double smallest = 0.0;
    double largest = 0.0;
    std::optional<double> deviation = {};  ///< from two values on
};

/// All pits fitted together.
struct PooledFit {
    std::vector<LawFitAnswer> laws;
    std::vector<RankedLaw> ranking;
    std::vector<PitSpread> spread;  ///< law after law, parameter after parameter
    std::vector<FitWarning> warnings;
};

struct FieldFit {
    FieldFitOptions options;
    std::vector<TestFit> pits;
    std::optional<PooledFit> pooled = {};  ///< where there are two pits or more
};

/// The fit, or what is wrong with the options or the tests, one sentence each.
struct FieldFitAnswer {
    std::optional<FieldFit> fit;
    std::vector<std::string> problems;
};

/// Fits every law asked for to every test and, where there are several, to all of them together.
[[nodiscard]] FieldFitAnswer fit_field_tests(std::span<const InfiltrationTest> tests,
                                             const FieldFitOptions& options);

}  // namespace rainledger
