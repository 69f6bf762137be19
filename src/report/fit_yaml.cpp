#include <algorithm>
#include <cmath>
#include <cstddef>

#include <fmt/core.h>

#include "rainledger/base/number.hpp"
#include "report/fit_parts.hpp"
#include "report/lookup_parts.hpp"

namespace rainledger {
namespace {

/// What a block is made of.
struct ChosenLaw {
    const LawFit& fit;
    std::size_t rank;  ///< 0: the best
};

bool scenarios_know(FieldLaw law) {
    return law == FieldLaw::horton || law == FieldLaw::green_ampt || law == FieldLaw::philip;
}

/// Why a fit cannot stand in a scenario; empty where it can.
std::string obstacle(const LawFit& fit) {
    if (!scenarios_know(fit.law)) return "scenarios do not know it (it is for comparison)";
    if (!fit.converged) return "the fit did not settle";
    const auto unlimited = [](const ParameterEstimate& estimate) {
        return std::isinf(estimate.value);
    };
    if (std::ranges::any_of(fit.parameters, unlimited))
        return "its conductivity is 0 and its suction-deficit product unlimited, which no scenario "
               "can hold";
    return {};
}

std::string why_none(const RankedFits& fits, FieldLaw law) {
    const std::string name(field_law_name(law));
    const auto answer = std::ranges::find(fits.laws, law, &LawFitAnswer::law);
    if (answer == fits.laws.end()) return name + " is not among the laws fitted";
    if (!answer->fit) return name + " could not be fitted: " + answer->problem;
    return name + ": " + obstacle(*answer->fit);
}

std::optional<ChosenLaw> chosen_law(const RankedFits& fits, std::optional<FieldLaw> law,
                                    std::string& problem) {
    for (std::size_t rank = 0; rank < fits.ranking.size(); ++rank) {
        const LawFit& fit = *fits.laws[fits.ranking[rank].index].fit;
        const bool wanted = !law || *law == fit.law;
        if (wanted && obstacle(fit).empty()) return ChosenLaw{fit, rank};
    }
    problem = law ? why_none(fits, *law)
                  : "no law that scenarios can hold (Horton, Green-Ampt, Philip) was fitted";
    return std::nullopt;
}

std::string comment(std::string_view words) {
    return filled("# ", printable(words), "# ", kFitWidth);
}

/// A value as the scenario has it: its rate divided for design, in its canonical unit.
std::string scenario_value(const ParameterEstimate& estimate) {
    return plain_number(estimate.design_value) + " " +
           std::string(parameter_words(estimate.key).scenario_unit);
}

/// What the design factor makes of a parameter.
double design_scale(const ParameterEstimate& estimate) {
    return estimate.value == 0.0 ? 1.0 : estimate.design_value / estimate.value;
}

std::string origin_comments(const ShownFit& shown, const LawFit& fit) {
    const FieldFit& field = shown.fit;
    std::string out = comment("Infiltration from a field test, for a surface of a scenario.");
    if (!shown.title.empty()) out += comment(shown.title);
    std::string words = fmt::format("{}, fitted to {} readings of {}", field_law_name(fit.law),
                                    reading_count(field), shown.readings);
    if (field.pooled) words += fmt::format(", {} pits together", field.pits.size());
    words += fmt::format("; RMSE {} mm, R2 {}", fixed(fit.rmse_mm, 2), fixed(fit.r_squared, 4));
    out += comment(words);
    const std::string alone = field.pooled ? best_alone_words(field) : std::string();
    return alone.empty() ? out
                         : out + comment("ranked first in the pits, each fitted alone: " + alone);
}

/// Laws that rank before the one in the block, and why they are not there.
std::string passed_over(const RankedFits& fits, const ChosenLaw& chosen, bool named) {
    std::string out;
    for (std::size_t rank = 0; rank < chosen.rank; ++rank) {
        const LawFit& fit = *fits.laws[fits.ranking[rank].index].fit;
        const std::string why =
            named ? std::string(field_law_name(chosen.fit.law)) + " was asked for" : obstacle(fit);
        out +=
            comment(fmt::format("{} ranks before this law, but {}", field_law_name(fit.law), why));
    }
    return out;
}

std::string design_comments(const FieldFitOptions& options, const LawFit& fit) {
    if (!(options.design_factor > 1.0)) return {};
    std::string fitted;
    for (const ParameterEstimate& estimate : fit.parameters) {
        const ParameterWords& words = parameter_words(estimate.key);
        fitted += fmt::format("{}{} {} {}", fitted.empty() ? "" : ", ", words.words,
                              plain_number(estimate.value), words.scenario_unit);
    }
    return comment(fmt::format("rates divided by {} for design, as asked; as fitted: {}",
                               four_figures(options.design_factor), fitted));
}

std::string spread_comments(const FieldFit& field, const LawFit& fit) {
    if (!field.pooled) return {};
    const Display display(DisplayUnits::metric);
    std::string words;
    for (const PitSpread& spread : field.pooled->spread) {
        if (spread.law != fit.law) continue;
        words += fmt::format("{}{} {} to {} {}", words.empty() ? "" : ", ",
                             parameter_words(spread.key).words,
                             parameter_number(spread.key, spread.smallest, display),
                             parameter_number(spread.key, spread.largest, display),
                             parameter_words(spread.key).scenario_unit);
    }
    return comment("between the pits, as fitted: " + words +
                   "; that spread, not the interval, is the uncertainty of the site");
}

/// Warnings of the test and of the law; those about other laws, and the spread of pits, which
/// stands in a comment of its own, are left out.
std::string warning_comments(const FieldFit& field, const LawFit& fit) {
    std::vector<FitWarning> warnings;
    if (!field.pooled) warnings = field.pits.front().warnings;
    std::erase_if(warnings, [&](const FitWarning& warning) {
        return warning.caution == FitCaution::no_fit ||
               (warning.caution == FitCaution::final_depends_on_end && fit.law != FieldLaw::horton);
    });
    warnings.insert(warnings.end(), fit.warnings.begin(), fit.warnings.end());
    std::string out;
    for (const FitWarning& warning : warnings)
        out += comment("warning: " + warning.text);
    return out;
}

std::string interval_comment(const ParameterEstimate& estimate) {
    switch (estimate.kind) {
        case EstimateKind::on_bound:
            return "  # on its bound";
        case EstimateKind::held:
            return "  # held, not fitted";
        case EstimateKind::unlimited:
        case EstimateKind::fitted:
            break;
    }
    if (!estimate.low) return {};
    const double scale = design_scale(estimate);
    return fmt::format("  # 95 % interval {} to {}", four_figures(*estimate.low * scale),
                       four_figures(*estimate.high * scale));
}

std::string losses_block(const LawFit& fit) {
    std::string out = fmt::format("losses:\n  {}:\n", field_law_key(fit.law));
    for (const ParameterEstimate& estimate : fit.parameters)
        out += fmt::format("    {}: {}{}\n", parameter_words(estimate.key).scenario_key,
                           scenario_value(estimate), interval_comment(estimate));
    return out;
}

std::string covariance_rows(const LawFit& fit) {
    const std::size_t n = fit.parameters.size();
    std::string out;
    for (std::size_t row = 0; row < n; ++row) {
        out += "    - [";
        for (std::size_t column = 0; column < n; ++column) {
            const double scale =
                design_scale(fit.parameters[row]) * design_scale(fit.parameters[column]);
            out += (column > 0 ? ", " : "") + shortest(fit.covariance[row * n + column] * scale);
        }
        out += "]\n";
    }
    return out;
}

std::string draws_block(const FieldFit& field, const LawFit& fit) {
    if (fit.covariance.empty())
        return comment(
            "no draws: the readings leave nothing from which the parameters' errors can be told");
    std::string names;
    std::string means;
    for (const ParameterEstimate& estimate : fit.parameters) {
        const std::string_view between = names.empty() ? "" : ", ";
        names += fmt::format("{}{}", between, estimate.key);
        means += fmt::format("{}{}", between, shortest(estimate.design_value));
    }
    std::string out = comment(
        "For what-if runs: means and covariance of the same parameters; zeros where one was not "
        "fitted freely.");
    if (field.pooled)
        out += comment("They are those of the fit to all pits and narrower than the site.");
    return out + fmt::format(
                     "draws:\n  law: {}\n  names: [{}]\n  means: [{}]\n  covariance:\n{}"
                     "  degrees_of_freedom: {}\n",
                     field_law_key(fit.law), names, means, covariance_rows(fit),
                     fit.degrees_of_freedom);
}

}  // namespace

std::optional<std::string> fit_yaml(const ShownFit& shown, std::optional<FieldLaw> law,
                                    std::string& problem) {
    const RankedFits fits = site_fits(shown.fit);
    const auto chosen = chosen_law(fits, law, problem);
    if (!chosen) return std::nullopt;
    const LawFit& fit = chosen->fit;
    return origin_comments(shown, fit) + passed_over(fits, *chosen, law.has_value()) +
           design_comments(shown.fit.options, fit) + spread_comments(shown.fit, fit) +
           warning_comments(shown.fit, fit) + comment(kFitCaution) + losses_block(fit) + "\n" +
           draws_block(shown.fit, fit);
}

}  // namespace rainledger
