#include "report/json_rain.hpp"

#include <cstddef>
#include <variant>

#include "rainledger/report/version.hpp"
#include "report/rain_words.hpp"

namespace rainledger {
namespace {

void write_held(JsonWriter& json, const std::vector<HeldStatistic>& held) {
    json.begin_array();
    for (const HeldStatistic& one : held) {
        json.begin_object();
        json.member("duration_h", one.duration_h);
        json.member("statistic_mm", one.statistic_mm);
        json.member("storm_mm", one.storm_mm);
        json.end_object();
    }
    json.end_array();
}

void write_rarity(JsonWriter& json, const EventRarity& rarity) {
    json.begin_object();
    json.key("by_duration");
    json.begin_array();
    for (const DurationRarity& one : rarity.by_duration) {
        json.begin_object();
        json.member("duration_h", one.duration_h);
        json.member("depth_mm", one.depth_mm);
        json.member("return_period_yr", one.rarity.years);
        json.member("more_than_yr", one.rarity.more_than);
        json.member("less_than_yr", one.rarity.less_than);
        json.end_object();
    }
    json.end_array();
    json.key("rarest_duration_h");
    if (rarity.by_duration.empty())
        json.null();
    else
        json.value(rarity.by_duration[rarity.rarest].duration_h);
    json.end_object();
}

/// The origin of a storm as one member; none for rain as given.
struct OriginWriter {
    JsonWriter& json;

    void operator()(std::monostate /*as given*/) const {}

    void operator()(const DesignOrigin& design) const {
        json.key("design");
        json.begin_object();
        json.member("pattern", pattern_key(design.pattern));
        json.member("duration_h", design.duration_h);
        json.member("every_h", design.every_h);
        json.member("peak_at", design.peak_at);
        json.member("peak_at_assumed", design.peak_at_assumed);
        json.member("return_period_yr", design.return_period_yr);
        text_or_null(json, "depth_from", design.depth_words);
        text_or_null(json, "curve", design.curve_words);
        json.key("held");
        write_held(json, design.held);
        json.end_object();
    }

    void operator()(const EventOrigin& origin) const {
        const RainEvent& event = origin.event;
        const bool numbered = event.number > 0;
        json.key("event");
        json.begin_object();
        json.member("number", numbered ? std::optional(event.number) : std::nullopt);
        json.member("events_in_record",
                    numbered ? std::optional(origin.events_in_record) : std::nullopt);
        write_event_figures(json, event, origin.rarity ? &*origin.rarity : nullptr);
        json.end_object();
    }
};

void write_resampled(JsonWriter& json, const ResampledFrom& from) {
    json.key("resampled");
    json.begin_object();
    json.member("every_h", from.every_h);
    json.member("peak_before_mm_per_h", from.peak_before_mm_per_h);
    json.member("peak_after_mm_per_h", from.peak_after_mm_per_h);
    json.end_object();
}

}  // namespace

void begin_results(JsonWriter& json, const std::string& title) {
    json.begin_object();
    text_or_null(json, "title", title);
    json.key("program");
    json.begin_object();
    json.member("name", "rainledger");
    json.member("version", version());
    json.end_object();
}

void end_results(JsonWriter& json, std::span<const std::string> warnings,
                 std::string_view caution) {
    json.key("warnings");
    json.begin_array();
    for (const std::string& warning : warnings)
        json.value(warning);
    json.end_array();
    json.member("caution", caution);
    json.end_object();
}

void text_or_null(JsonWriter& json, std::string_view key, std::string_view text) {
    json.key(key);
    if (text.empty())
        json.null();
    else
        json.value(text);
}

void write_event_figures(JsonWriter& json, const RainEvent& event, const EventRarity* rarity) {
    json.member("depth_mm", event.depth_mm);
    json.key("peaks_mm");
    json.begin_object();
    for (std::size_t i = 0; i < kEventWindowsMinutes.size(); ++i)
        json.member(std::to_string(kEventWindowsMinutes[i]), event.peak_mm[i]);
    json.end_object();
    json.member("antecedent_5_day_mm", event.antecedent_5_day_mm);
    json.member("antecedent_known", event.antecedent_known);
    json.member("without_data_h", event.without_data_h);
    json.key("rarity");
    if (rarity != nullptr)
        write_rarity(json, *rarity);
    else
        json.null();
}

void write_rain(JsonWriter& json, const Storm& storm) {
    const Hyetograph& rain = storm.rain;
    json.begin_object();
    json.member("depth_mm", total_depth_mm(rain));
    json.member("duration_h", own_duration_h(rain));
    json.member("peak_intensity_mm_per_h", peak_intensity_mm_per_h(rain));
    json.member("steps", rain.own_steps);
    text_or_null(json, "starts", rain.stamps ? iso_stamp(*rain.stamps, 0) : std::string());
    json.member("starts_h", rain.edges_h.front());
    text_or_null(json, "file", storm.file);
    json.member("multiply_by", storm.multiply_by);
    json.member("continued_h", storm.continued_h);
    json.member("taken_as_dry_h", rain.taken_as_dry_h);
    json.member("clock_assumed", rain.clock_assumed);
    std::visit(OriginWriter{json}, storm.origin);
    if (storm.resampled) write_resampled(json, *storm.resampled);
    json.end_object();
}

}  // namespace rainledger
