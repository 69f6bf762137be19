#include "report/json_parameters.hpp"

#include <array>
#include <string>
#include <variant>

#include "report/curve_number_words.hpp"

namespace rainledger {
namespace {

struct ParameterWriter {
    JsonWriter& json;
    std::optional<double> matched;

    void curve(const HortonCurve& curve) const {
        json.member("initial_capacity_mm_per_h", curve.initial_capacity_mm_per_h);
        json.member("final_capacity_mm_per_h", curve.final_capacity_mm_per_h);
        json.member("decay_per_h", curve.decay_per_h);
    }
    void operator()(const Horton& law) const {
        curve(law.curve);
        json.member("follows", "infiltrated_depth");
        json.key("recovery_per_h");
        if (law.recovery_per_h > 0.0)
            json.value(law.recovery_per_h);
        else
            json.null();
    }
    void operator()(const HortonElapsed& law) const {
        curve(law.curve);
        json.member("follows", "elapsed_time");
        json.key("recovery_per_h");
        json.null();
    }
    void operator()(const GreenAmpt& law) const {
        json.member("effective_conductivity_mm_per_h", law.conductivity_mm_per_h);
        json.member("suction_deficit_mm", law.suction_deficit_mm);
        json.member("storage_limit_mm", law.storage_limit_mm);
        json.key("barrier_rate_mm_per_h");
        if (law.storage_limit_mm)
            json.value(law.barrier_rate_mm_per_h);
        else
            json.null();
    }
    void operator()(const Philip& law) const {
        json.member("sorptivity_mm_per_sqrt_h", law.sorptivity_mm_per_sqrt_h);
        json.member("steady_term_mm_per_h", law.steady_term_mm_per_h);
    }
    void operator()(const ConstantRate& law) const {
        json.member("rate_mm_per_h", law.rate_mm_per_h);
        json.member("initial_loss_mm", law.initial_loss_mm);
    }
    void operator()(const PhiIndex& law) const {
        json.member("observed_excess_mm", law.observed_excess_mm);
        json.member("rate_mm_per_h", matched);
    }
    void operator()(const Impervious& /*law*/) const {}
    void operator()(const CurveNumber& given) const {
        const CurveNumberInUse use = number_in_use(given);
        json.member("number", given.number);
        json.member("antecedent", condition_name(given.antecedent));
        json.member("number_used", use.number_used);
        json.member("initial_abstraction_ratio", given.initial_abstraction_ratio);
        json.member("tabulated_ratio", given.tabulated_ratio);
        json.member("retention_mm", use.curve.retention_mm);
        json.member("initial_abstraction_mm", use.curve.initial_abstraction_mm);
        json.key("source");
        const std::string source = conversion_source(use);
        if (source.empty())
            json.null();
        else
            json.value(source);
    }
};

}  // namespace

std::string_view method_key(const Losses& losses) {
    // In the order of the variant's alternatives.
    constexpr std::array<std::string_view, std::variant_size_v<Losses>> kKeys{
        "horton",        "horton",    "green_ampt", "philip",
        "constant_rate", "phi_index", "impervious", "curve_number"};
    return kKeys[losses.index()];
}

void write_parameters(JsonWriter& json, const Losses& losses, std::optional<double> matched) {
    json.begin_object();
    std::visit(ParameterWriter{json, matched}, losses);
    json.end_object();
}

}  // namespace rainledger
