#include "report/loss_words.hpp"

#include <string_view>
#include <variant>

#include "rainledger/base/number.hpp"
#include "report/curve_number_words.hpp"

namespace rainledger {
namespace {

struct MethodWords {
    std::string operator()(const Horton& /*law*/) const { return "Horton"; }
    std::string operator()(const HortonElapsed& /*law*/) const { return "Horton, elapsed time"; }
    std::string operator()(const GreenAmpt& /*law*/) const { return "Green-Ampt"; }
    std::string operator()(const Philip& /*law*/) const { return "Philip"; }
    std::string operator()(const ConstantRate& /*law*/) const { return "constant rate"; }
    std::string operator()(const PhiIndex& /*law*/) const { return "phi index"; }
    std::string operator()(const Impervious& /*law*/) const { return "impervious"; }
    std::string operator()(const CurveNumber& given) const {
        return "curve number " + four_figures(given.number);
    }
};

struct AssumptionWords {
    const Display& display;

    [[nodiscard]] std::string rate(std::string_view name, double mm_per_h) const {
        return std::string(name) + " " + display.parameter(mm_per_h, Dimension::rate);
    }
    [[nodiscard]] std::string depth(std::string_view name, double mm) const {
        return std::string(name) + " " + display.parameter(mm, Dimension::depth);
    }
    [[nodiscard]] std::string curve(const HortonCurve& curve) const {
        return rate(", initial capacity", curve.initial_capacity_mm_per_h) +
               rate(", final", curve.final_capacity_mm_per_h) + ", decay " +
               display.parameter(curve.decay_per_h, Dimension::decay);
    }

    std::string operator()(const Horton& law) const {
        std::string out = "Horton following infiltrated depth" + curve(law.curve);
        if (law.recovery_per_h > 0.0)
            out += ", recovery " + display.parameter(law.recovery_per_h, Dimension::decay);
        return out;
    }
    std::string operator()(const HortonElapsed& law) const {
        return "Horton following elapsed time" + curve(law.curve);
    }
    std::string operator()(const GreenAmpt& law) const {
        std::string out = "Green-Ampt" + rate(", conductivity", law.conductivity_mm_per_h) +
                          depth(", suction times deficit", law.suction_deficit_mm);
        if (law.storage_limit_mm) {
            out += depth(", storage limit", *law.storage_limit_mm) +
                   rate(" and then at most", law.barrier_rate_mm_per_h);
        }
        return out;
    }
    std::string operator()(const Philip& law) const {
        return "Philip, sorptivity " +
               display.parameter(law.sorptivity_mm_per_sqrt_h, Dimension::sorptivity) +
               rate(", steady term", law.steady_term_mm_per_h);
    }
    std::string operator()(const ConstantRate& law) const {
        std::string out = rate("constant rate", law.rate_mm_per_h);
        if (law.initial_loss_mm > 0.0)
            out += depth(" after an initial loss of", law.initial_loss_mm);
        return out;
    }
    std::string operator()(const PhiIndex& law) const {
        return depth("phi index for an observed excess of", law.observed_excess_mm);
    }
    std::string operator()(const Impervious& /*law*/) const { return "impervious"; }
    std::string operator()(const CurveNumber& given) const {
        const CurveNumberInUse use = number_in_use(given);
        std::string out = "curve number " + four_figures(given.number);
        if (use.condition_converted || use.ratio_converted) out += " given";
        if (use.condition_converted) {
            out += "; " + four_figures(use.for_condition) + " for antecedent condition " +
                   std::string(condition_name(given.antecedent));
        }
        if (use.ratio_converted)
            out += "; " + four_figures(use.number_used) + " from ratio 0.2 to 0.05";
        const std::string source = conversion_source(use);
        if (!source.empty()) out += " (" + source + ")";
        return out + ", initial abstraction " + four_figures(given.initial_abstraction_ratio) +
               " of retention " + display.depth_with_unit(use.curve.retention_mm) + ", that is " +
               display.depth_with_unit(use.curve.initial_abstraction_mm);
    }
};

}  // namespace

std::string method_words(const Losses& losses) {
    return std::visit(MethodWords{}, losses);
}

std::string assumption_words(const Losses& losses, const Display& display) {
    return std::visit(AssumptionWords{display}, losses);
}

bool can_pond(const Losses& losses) {
    return !std::holds_alternative<Impervious>(losses) &&
           !std::holds_alternative<CurveNumber>(losses);
}

}  // namespace rainledger
