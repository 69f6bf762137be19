#include <cmath>
#include <cstddef>
#include <utility>

#include "report/fit_parts.hpp"
#include "report/json_rain.hpp"

namespace rainledger {
namespace {

std::string_view kind_key(EstimateKind kind) {
    switch (kind) {
        case EstimateKind::fitted:
            return "fitted";
        case EstimateKind::on_bound:
            return "on_bound";
        case EstimateKind::held:
            return "held";
        case EstimateKind::unlimited:
            break;
    }
    return "unlimited";
}

void write_parameter(JsonWriter& json, const ParameterEstimate& estimate) {
    json.key(estimate.key);
    json.begin_object();
    json.member("value", estimate.value);
    json.member("standard_error", estimate.standard_error);
    json.member("low", estimate.low);
    json.member("high", estimate.high);
    json.member("kind", kind_key(estimate.kind));
    json.member("design_value", estimate.design_value);
    json.end_object();
}

void write_covariance(JsonWriter& json, const LawFit& fit) {
    json.key("covariance");
    if (fit.covariance.empty()) {
        json.null();
        return;
    }
    const std::size_t n = fit.parameters.size();
    json.begin_array();
    for (std::size_t row = 0; row < n; ++row) {
        json.begin_array();
        for (std::size_t column = 0; column < n; ++column)
            json.value(fit.covariance[row * n + column]);
        json.end_array();
    }
    json.end_array();
}

void write_warnings(JsonWriter& json, const std::vector<FitWarning>& warnings) {
    json.key("warnings");
    json.begin_array();
    for (const FitWarning& warning : warnings) {
        json.begin_object();
        json.member("caution", fit_caution_key(warning.caution));
        json.member("text", warning.text);
        json.end_object();
    }
    json.end_array();
}

template <class Value>
void write_column(JsonWriter& json, std::string_view key, const LawFit& fit, Value value) {
    json.key(key);
    json.begin_array();
    for (const FittedReading& reading : fit.readings)
        json.value(reading.*value);
    json.end_array();
}

void write_quality(JsonWriter& json, const LawFit& fit) {
    json.member("rmse_mm", fit.rmse_mm);
    json.member("r_squared", fit.r_squared);
    json.member("aicc", fit.aicc);
    json.member("fitted_to", fit.on_intervals ? "interval_depths" : "cumulative_depths");
    json.member("interval_method", "delta");
    json.member("residual_sum_mm2", fit.residual_sum_mm2);
    json.member("degrees_of_freedom", fit.degrees_of_freedom);
    json.member("residual_deviation_mm", fit.residual_deviation_mm);
    json.member("lag_one_correlation", fit.lag_one_correlation);
    json.member("converged", fit.converged);
}

void write_law(JsonWriter& json, const LawFitAnswer& answer) {
    json.key(field_law_key(answer.law));
    if (!answer.fit) {
        json.null();
        return;
    }
    const LawFit& fit = *answer.fit;
    json.begin_object();
    for (const ParameterEstimate& estimate : fit.parameters)
        write_parameter(json, estimate);
    write_quality(json, fit);
    write_covariance(json, fit);
    write_column(json, "fitted_depth_mm", fit, &FittedReading::fitted_depth_mm);
    write_column(json, "fitted_rate_mm_per_h", fit, &FittedReading::fitted_rate_mm_per_h);
    write_column(json, "residual_mm", fit, &FittedReading::residual_mm);
    write_warnings(json, fit.warnings);
    json.end_object();
}

/// "laws" and "ranking".
void write_laws(JsonWriter& json, const RankedFits& fits) {
    json.key("laws");
    json.begin_object();
    for (const LawFitAnswer& answer : fits.laws)
        write_law(json, answer);
    json.end_object();
    json.key("ranking");
    json.begin_array();
    for (const RankedLaw& ranked : fits.ranking) {
        json.begin_object();
        json.member("law", field_law_key(ranked.law));
        json.member("aicc_above_best", ranked.aicc_above_best);
        json.end_object();
    }
    json.end_array();
}

void write_line(JsonWriter& json, const LineFit& fit) {
    json.begin_object();
    const auto& line = fit.answer.line;
    const auto of_line = [&](auto value) {
        return line ? std::optional(value(*line)) : std::nullopt;
    };
    json.member("initial_capacity_mm_per_h",
                of_line([](const HortonLine& l) { return l.curve.initial_capacity_mm_per_h; }));
    json.member("final_capacity_mm_per_h",
                of_line([](const HortonLine& l) { return l.curve.final_capacity_mm_per_h; }));
    json.member("decay_per_h", of_line([](const HortonLine& l) { return l.curve.decay_per_h; }));
    json.member("decay_standard_error_per_h",
                line ? line->decay_standard_error_per_h : std::nullopt);
    json.member("rates_used", of_line([](const HortonLine& l) { return l.used; }));
    json.member("rates_left_out", fit.answer.left_out);
    json.member("line_r_squared", of_line([](const HortonLine& l) { return l.r_squared; }));
    json.member("rmse_mm", fit.rmse_mm);
    json.key("less_fit");
    if (fit.bias) {
        json.begin_object();
        json.member("initial_capacity_mm_per_h", fit.bias->initial_capacity_mm_per_h);
        json.member("final_capacity_mm_per_h", fit.bias->final_capacity_mm_per_h);
        json.member("decay_per_h", fit.bias->decay_per_h);
        json.member("rmse_mm", fit.bias->rmse_mm);
        json.end_object();
    } else {
        json.null();
    }
    text_or_null(json, "problem", fit.answer.problem);
    json.end_object();
}

void write_lines(JsonWriter& json, const std::vector<LineFit>& lines) {
    json.key("straight_line");
    json.begin_object();
    for (const LineFit& line : lines) {
        json.key(line.place == RatePlace::interval_end ? "interval_end" : "interval_middle");
        write_line(json, line);
    }
    json.end_object();
}

void write_convention(JsonWriter& json, const TestFit& pit, const SteadyRate& rate) {
    json.key(steady_convention_key(rate.convention));
    json.begin_object();
    json.key("steady");
    if (rate.undecided)
        json.null();
    else
        json.value(rate.steady);
    json.member("first_reading", pit.ignored_readings + rate.first_reading + 1);
    json.member("from_h", pit.test.readings[rate.first_reading].start_h);
    json.member("readings", rate.readings);
    json.member("mean_mm_per_h", rate.mean_mm_per_h);
    json.member("standard_error_mm_per_h", rate.standard_error_mm_per_h);
    json.member("low_mm_per_h", rate.low_mm_per_h);
    json.member("high_mm_per_h", rate.high_mm_per_h);
    json.member("relative_change", rate.relative_change);
    json.end_object();
}

void write_steady(JsonWriter& json, const TestFit& pit) {
    json.key("steady");
    json.begin_object();
    json.member("steady", pit.tail_rate().steady);
    json.member("tail_by", steady_convention_key(pit.tail_rate().convention));
    json.member("tail_mm_per_h", pit.tail_rate().mean_mm_per_h);
    json.key("conventions");
    json.begin_object();
    for (const SteadyRate& rate : pit.steady)
        write_convention(json, pit, rate);
    json.end_object();
    json.key("final_capacity_without_end");
    if (pit.final_without_end) {
        json.begin_object();
        json.member("readings_left_out", pit.final_without_end->left_out);
        json.member("with_mm_per_h", pit.final_without_end->with_mm_per_h);
        json.member("without_mm_per_h", pit.final_without_end->without_mm_per_h);
        json.end_object();
    } else {
        json.null();
    }
    json.end_object();
}

void write_readings(JsonWriter& json, const TestFit& pit) {
    json.key("readings");
    json.begin_array();
    for (const TestReading& reading : pit.test.readings) {
        json.begin_object();
        json.member("start_h", reading.start_h);
        json.member("middle_h", reading.middle_h);
        json.member("end_h", reading.end_h);
        json.member("interval_mm", reading.interval_mm);
        json.member("depth_mm", reading.depth_mm);
        json.member("rate_mm_per_h", reading.rate_mm_per_h);
        json.end_object();
    }
    json.end_array();
}

void write_results(JsonWriter& json, const TestFit& pit) {
    write_laws(json, {pit.laws, pit.ranking});
    write_lines(json, pit.lines);
    write_steady(json, pit);
}

void write_pit(JsonWriter& json, const TestFit& pit) {
    json.key(pit_key(pit.test));
    json.begin_object();
    json.member("kind", reading_kind_name(pit.test.kind));
    json.member("ignored_readings", pit.ignored_readings);
    json.member("from_h", pit.test.from_h);
    write_results(json, pit);
    write_readings(json, pit);
    write_warnings(json, pit.warnings);
    json.end_object();
}

void write_spread(JsonWriter& json, const PitSpread& spread) {
    json.begin_object();
    json.member("law", field_law_key(spread.law));
    json.member("parameter", spread.key);
    json.key("values");
    json.begin_array();
    for (const auto& value : spread.values)
        json.value(value);
    json.end_array();
    json.member("mean", spread.mean);
    json.member("smallest", spread.smallest);
    json.member("largest", spread.largest);
    json.member("standard_deviation", spread.deviation);
    json.end_object();
}

void write_pooled(JsonWriter& json, const FieldFit& fit) {
    json.key("pooled");
    if (!fit.pooled) {
        json.null();
        return;
    }
    json.begin_object();
    write_laws(json, site_fits(fit));
    json.key("spread");
    json.begin_array();
    for (const PitSpread& spread : fit.pooled->spread)
        write_spread(json, spread);
    json.end_array();
    write_warnings(json, fit.pooled->warnings);
    json.end_object();
}

}  // namespace

std::string fit_json(const ShownFit& shown, std::span<const std::string> warnings) {
    const FieldFit& fit = shown.fit;
    JsonWriter json;
    begin_results(json, shown.title);
    text_or_null(json, "readings_file", shown.readings);
    json.member("single_ring", shown.single_ring);
    json.member("design_factor", fit.options.design_factor);
    if (fit.pits.size() == 1) write_results(json, fit.pits.front());
    json.key("pits");
    json.begin_object();
    for (const TestFit& pit : fit.pits)
        write_pit(json, pit);
    json.end_object();
    write_pooled(json, fit);
    std::vector<std::string> all(warnings.begin(), warnings.end());
    for (std::string& warning : all_fit_warnings(fit))
        all.push_back(std::move(warning));
    end_results(json, all, kFitCaution);
    return std::move(json).take();
}

}  // namespace rainledger
