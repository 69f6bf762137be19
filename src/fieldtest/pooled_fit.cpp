#include "fieldtest/pooled_fit.hpp"

#include <algorithm>
#include <cmath>
#include <string>

#include "fieldtest/law_warnings.hpp"

namespace rainledger {
namespace {

LawFitOptions pooled_options(std::span<const TestFit> pits, const FieldFitOptions& options) {
    LawFitOptions pooled;
    pooled.design_factor = options.design_factor;
    if (options.steady_use == SteadyUse::fixed)
        pooled.final_capacity_mm_per_h = options.fixed_rate_mm_per_h;
    if (options.steady_use != SteadyUse::tail) return pooled;
    double sum = 0.0;
    for (const TestFit& pit : pits)
        sum += pit.tail_rate().mean_mm_per_h;
    pooled.final_capacity_mm_per_h = sum / static_cast<double>(pits.size());
    return pooled;
}

void add_statistics(PitSpread& spread) {
    std::vector<double> known;
    for (const auto& value : spread.values)
        if (value && std::isfinite(*value)) known.push_back(*value);
    if (known.empty()) return;
    const double n = static_cast<double>(known.size());
    const auto [smallest, largest] = std::ranges::minmax(known);
    spread.smallest = smallest;
    spread.largest = largest;
    for (const double value : known)
        spread.mean += value / n;
    if (known.size() < 2) return;
    double squares = 0.0;
    for (const double value : known)
        squares += (value - spread.mean) * (value - spread.mean);
    spread.deviation = std::sqrt(squares / (n - 1.0));
}

PitSpread spread_of(std::span<const TestFit> pits, const LawFit& pooled, std::size_t law,
                    std::size_t parameter) {
    PitSpread spread;
    spread.law = pooled.law;
    spread.key = pooled.parameters[parameter].key;
    for (const TestFit& pit : pits) {
        const auto& fit = pit.laws[law].fit;
        spread.values.push_back(fit ? std::optional(fit->parameters[parameter].value)
                                    : std::nullopt);
    }
    add_statistics(spread);
    return spread;
}

/// The pits lie further apart than the interval of the pooled fit of the best law says.
void warn_of_spread(PooledFit& pooled) {
    if (pooled.ranking.empty()) return;
    const RankedLaw best = pooled.ranking.front();
    const LawFit& fit = *pooled.laws[best.index].fit;
    std::string names;
    for (const PitSpread& spread : pooled.spread) {
        if (spread.law != best.law || !spread.deviation) continue;
        const auto& estimate =
            *std::ranges::find(fit.parameters, spread.key, &ParameterEstimate::key);
        if (!estimate.low || (*estimate.low <= spread.smallest && spread.largest <= *estimate.high))
            continue;
        names += (names.empty() ? "" : ", ") + std::string(words_of_parameter(spread.key));
    }
    if (names.empty()) return;
    pooled.warnings.push_back(
        {FitCaution::pits_differ, std::string(field_law_name(best.law)) +
                                      ": the pits differ by more than the pooled fit's "
                                      "interval says (" +
                                      names +
                                      "): the spread between pits is the uncertainty of the site"});
}

}  // namespace

PooledFit pool_pits(std::span<const TestFit> pits, const FieldFitOptions& options) {
    std::vector<InfiltrationTest> tests;
    for (const TestFit& pit : pits)
        tests.push_back(pit.test);
    const LawFitOptions law_options = pooled_options(pits, options);
    PooledFit pooled;
    for (const FieldLaw law : options.laws)
        pooled.laws.push_back(fit_law(tests, law, law_options));
    pooled.ranking = rank_laws(pooled.laws);
    for (std::size_t law = 0; law < pooled.laws.size(); ++law)
        if (const auto& fit = pooled.laws[law].fit)
            for (std::size_t i = 0; i < fit->parameters.size(); ++i)
                pooled.spread.push_back(spread_of(pits, *fit, law, i));
    warn_of_spread(pooled);
    return pooled;
}

}  // namespace rainledger
