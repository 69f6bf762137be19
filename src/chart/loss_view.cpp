#include "chart/loss_view.hpp"

#include <algorithm>
#include <cmath>
#include <variant>

#include "chart/storm_view.hpp"
#include "chart/words.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

struct MethodName {
    std::string operator()(const Horton& /*law*/) const { return "Horton by infiltrated depth"; }
    std::string operator()(const HortonElapsed& /*law*/) const { return "Horton by elapsed time"; }
    std::string operator()(const GreenAmpt& /*law*/) const { return "Green and Ampt"; }
    std::string operator()(const Philip& /*law*/) const { return "Philip's two terms"; }
    std::string operator()(const ConstantRate& /*law*/) const { return "constant loss rate"; }
    std::string operator()(const PhiIndex& /*law*/) const { return "phi index"; }
    std::string operator()(const Impervious& /*law*/) const { return "impervious"; }
    std::string operator()(const CurveNumber& given) const {
        return "curve number " + shortest(given.number);
    }
};

LossView surface_view(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                      std::size_t storm, std::size_t surface) {
    const SurfaceLedger& ledger = ledgers[storm].surfaces[surface];
    return {{},
            {},
            &scenario.storms[storm],
            &scenario.site.surfaces[surface],
            ledger.rows,
            ledger.total,
            ledger.ponding,
            ledger.figures.volumetric_runoff_coefficient};
}

LossView site_view(const Storm& storm, const SiteLedger& ledger) {
    return {{},
            {},
            &storm,
            nullptr,
            ledger.site.rows,
            ledger.site.total,
            {},
            ledger.site.figures.volumetric_runoff_coefficient};
}

std::string surface_words(const Surface& surface) {
    return surface.name + ", " + loss_method(surface.losses);
}

}  // namespace

std::string loss_method(const Losses& losses) {
    return std::visit(MethodName{}, losses);
}

ChosenLosses chosen_losses(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                           const ChartChoice& choice) {
    const std::size_t storms = scenario.storms.size();
    const std::size_t surfaces = scenario.site.surfaces.size();
    const auto only = [](std::optional<std::size_t> chosen, std::size_t count) {
        return chosen || count > 1 ? chosen : std::optional<std::size_t>{0};
    };
    const auto storm = only(choice.storm, storms);
    const auto surface = only(choice.surface, surfaces);
    ChosenLosses out;
    if (storm && surface) {
        out.views.push_back(surface_view(scenario, ledgers, *storm, *surface));
        out.about = joined(surface_words(scenario.site.surfaces[*surface]),
                           storm_words(scenario.storms[*storm]));
        out.same_storm = true;
    } else if (storm) {
        for (std::size_t i = 0; i < surfaces; ++i) {
            out.views.push_back(surface_view(scenario, ledgers, *storm, i));
            out.views.back().name = scenario.site.surfaces[i].name;
            out.views.back().method = loss_method(scenario.site.surfaces[i].losses);
        }
        out.about = joined(storm_words(scenario.storms[*storm]), "every surface");
        out.same_storm = true;
        out.what = "surfaces";
    } else {
        for (std::size_t i = 0; i < storms; ++i) {
            out.views.push_back(surface ? surface_view(scenario, ledgers, i, *surface)
                                        : site_view(scenario.storms[i], ledgers[i]));
            out.views.back().name = scenario.storms[i].name;
        }
        out.about = surface ? surface_words(scenario.site.surfaces[*surface]) + ", every storm"
                            : "the whole site, every storm";
        out.what = "storms";
    }
    return out;
}

std::vector<StepRates> step_rates(const LossView& view, const ChartUnits& units) {
    const Hyetograph& rain = view.storm->rain;
    std::vector<StepRates> out;
    out.reserve(view.rows.size());
    double ponded_mm = 0.0;
    for (std::size_t step = 0; step < view.rows.size(); ++step) {
        const Accounts& row = view.rows[step].accounts;
        const double hours = rain.duration_h[step];
        const auto rate = [&](double mm) { return units.shown(mm / hours); };
        out.push_back({rate(row.rain_mm), rate(row.run_on_mm), rate(row.infiltrated_mm),
                       rate(row.initial_loss_mm), rate(std::max(row.ponded_mm - ponded_mm, 0.0)),
                       rate(row.excess_mm)});
        ponded_mm = row.ponded_mm;
    }
    return out;
}

std::vector<double> supply_weight(std::span<const StepRates> rates) {
    std::vector<double> weight;
    weight.reserve(rates.size());
    for (const StepRates& rate : rates)
        weight.push_back(std::max(rate.rain + rate.run_on, rate.infiltrated));
    return weight;
}

std::vector<DrawnStep> drawn_steps(const LossView& view, std::span<const StepRates> rates,
                                   std::size_t most) {
    return drawn_steps(view.storm->rain, rates.size(), supply_weight(rates), most);
}

std::string excess_words(const LossView& view, std::string_view coefficient,
                         const ChartUnits& units) {
    if (!view.coefficient) return "no rain";
    return "excess " + units.depth_words(view.total.excess_mm) + ", " + std::string(coefficient) +
           " " + fixed(*view.coefficient, 2);
}

std::string ledger_words(const ChosenLosses& losses, const ChartUnits& units, std::size_t most) {
    constexpr std::string_view kBetween = "; ";
    const LossView& view = losses.views.front();
    const std::string about = printable(losses.about);
    std::string figures = excess_words(view, "volumetric runoff coefficient", units);
    if (columns_used(about) + kBetween.size() + figures.size() > most)
        figures = excess_words(view, "coefficient by volume", units);
    return shortened(about, most - kBetween.size() - figures.size()) + std::string(kBetween) +
           figures;
}

}  // namespace rainledger
