#include "rainledger/report/storm_json.hpp"

#include <cstddef>
#include <string>
#include <utility>
#include <variant>

#include "rainledger/rain/rain_windows.hpp"
#include "rainledger/report/caution.hpp"
#include "report/json_rain.hpp"
#include "report/json_writer.hpp"
#include "report/rain_words.hpp"
#include "report/record_clock.hpp"

namespace rainledger {
namespace {

constexpr double kMinutesPerHour = 60.0;

void write_peaks(JsonWriter& json, const Hyetograph& rain) {
    json.begin_object();
    for (const int minutes : kPeakMinutes) {
        const double window_h = minutes / kMinutesPerHour;
        const double depth_mm = largest_window_depth_mm(rain, window_h);
        json.key(std::to_string(minutes));
        json.begin_object();
        json.member("depth_mm", depth_mm);
        json.member("intensity_mm_per_h", depth_mm / window_h);
        json.end_object();
    }
    json.end_object();
}

void write_steps(JsonWriter& json, const Hyetograph& rain) {
    json.begin_array();
    for (std::size_t step = 0; step < rain.own_steps; ++step) {
        json.begin_object();
        json.member("start_h", rain.edges_h[step]);
        json.member("end_h", rain.edges_h[step + 1]);
        if (rain.stamps) json.member("start", iso_stamp(*rain.stamps, step));
        json.member("depth_mm", rain.depth_mm[step]);
        json.end_object();
    }
    json.end_array();
}

void write_list(JsonWriter& json, std::string_view key, std::span<const double> values) {
    json.key(key);
    json.begin_array();
    for (const double value : values)
        json.value(value);
    json.end_array();
}

void write_table(JsonWriter& json, const RainfallStatistics& statistics) {
    write_list(json, "duration_h", statistics.duration_h);
    write_list(json, "return_period_yr", statistics.return_period_yr);
    const std::size_t columns = statistics.columns();
    json.key("depth_mm");
    json.begin_array();
    for (std::size_t row = 0; row < statistics.duration_h.size(); ++row) {
        json.begin_array();
        for (std::size_t column = 0; column < columns; ++column)
            json.value(statistics.at(row, column));
        json.end_array();
    }
    json.end_array();
    json.key("set_aside");
    json.begin_array();
    for (const std::string& words : statistics.set_aside)
        json.value(words);
    json.end_array();
}

void write_fit(JsonWriter& json, const FitAnswer& answer) {
    json.begin_object();
    if (answer.fit) {
        const FormulaFit& fit = *answer.fit;
        json.member("free", fit.form == FormulaForm::free_m ? "m" : "n");
        json.member("a_mm_per_h", fit.formula.a_mm_per_h);
        json.member("b", fit.formula.b);
        json.member("m", fit.formula.m);
        json.member("n", fit.formula.n);
        json.member("time_unit_h", fit.formula.time_unit_h);
        write_list(json, "residual", fit.residual);
        json.member("rms_log_residual", fit.rms_log_residual);
    }
    text_or_null(json, "problem", answer.problem);
    json.end_object();
}

void write_fits(JsonWriter& json, std::span<const ColumnFit> fits) {
    json.begin_array();
    for (const ColumnFit& column : fits) {
        json.begin_object();
        json.member("return_period_yr", column.return_period_yr);
        json.key("fits");
        json.begin_array();
        for (const FitAnswer& answer : column.fits)
            write_fit(json, answer);
        json.end_array();
        json.end_object();
    }
    json.end_array();
}

void write_notes(JsonWriter& json, const RecordNotes& notes) {
    json.begin_object();
    json.member("rows", notes.rows);
    json.member("same_instant", notes.same_instant);
    json.member("repeated_rows", notes.repeated_rows);
    json.member("clock_set_back", notes.clock_set_back);
    json.member("counter_restarts", notes.counter_restarts);
    json.member("repeated_headers", notes.repeated_headers);
    json.member("partial_last_line", notes.partial_last_line);
    json.end_object();
}

constexpr double kMsPerHour = 3600.0e3;

/// Two instants of a record, as stamps or in elapsed hours.
void write_span(JsonWriter& json, const RecordClock& clock, std::int64_t from_ms,
                std::int64_t to_ms) {
    json.member("starts", clock.iso(from_ms));
    json.member("ends", clock.iso(to_ms));
    if (clock.has_stamps()) return;
    json.member("starts_h", static_cast<double>(from_ms) / kMsPerHour);
    json.member("ends_h", static_cast<double>(to_ms) / kMsPerHour);
}

void write_record(JsonWriter& json, const GaugeRecord& record, const RecordClock& clock) {
    const auto* tips = std::get_if<TipLog>(&record.rain);
    const auto* rain = std::get_if<Hyetograph>(&record.rain);
    const RecordSpan span = span_of(record);
    json.begin_object();
    text_or_null(json, "file", record.file);
    json.member("kind", tips != nullptr ? "tips" : "intervals");
    json.member("tip_mm", tips != nullptr ? std::optional(tips->tip_mm) : std::nullopt);
    json.member("depth_mm", total_depth_mm(record));
    write_span(json, clock, span.from_ms, span.to_ms);
    json.member("taken_as_dry_h", rain != nullptr ? rain->taken_as_dry_h : 0.0);
    json.member("clock_assumed", tips != nullptr ? tips->clock_assumed : rain->clock_assumed);
    json.key("notes");
    write_notes(json, record.notes);
    json.end_object();
}

void write_event(JsonWriter& json, const RainEvent& event, const EventRarity* rarity,
                 const RecordClock& clock) {
    json.begin_object();
    json.member("number", event.number);
    write_span(json, clock, event.from_ms, event.to_ms);
    json.member("duration_h", static_cast<double>(event.to_ms - event.from_ms) / kMsPerHour);
    write_event_figures(json, event, rarity);
    json.end_object();
}

}  // namespace

std::string storm_json(const Scenario& scenario, std::span<const std::string> warnings) {
    JsonWriter json;
    begin_results(json, scenario.title);
    json.key("storms");
    json.begin_object();
    for (const Storm& storm : scenario.storms) {
        json.key(storm.name);
        json.begin_object();
        json.key("rain");
        write_rain(json, storm);
        json.key("peaks");
        write_peaks(json, storm.rain);
        json.key("steps");
        write_steps(json, storm.rain);
        json.end_object();
    }
    json.end_object();
    end_results(json, warnings, kRainCaution);
    return std::move(json).take();
}

std::string statistics_json(const std::string& title, const RainfallStatistics& statistics,
                            std::span<const ColumnFit> fits,
                            std::span<const std::string> warnings) {
    JsonWriter json;
    begin_results(json, title);
    json.key("statistics");
    json.begin_object();
    write_table(json, statistics);
    json.end_object();
    json.key("formulas");
    write_fits(json, fits);
    end_results(json, warnings, kRainCaution);
    return std::move(json).take();
}

std::string events_json(const std::string& title, const GaugeRecord& record, const EventRule& rule,
                        const RecordEvents& events, std::span<const EventRarity> rarities,
                        std::span<const std::string> warnings) {
    const RecordClock clock(record);
    JsonWriter json;
    begin_results(json, title);
    json.key("record");
    write_record(json, record, clock);
    json.key("rule");
    json.begin_object();
    json.member("dry_spell_h", rule.dry_spell_h);
    json.member("threshold_mm", rule.threshold_mm);
    json.end_object();
    json.key("events");
    json.begin_array();
    for (std::size_t i = 0; i < events.events.size(); ++i)
        write_event(json, events.events[i], rarities.empty() ? nullptr : &rarities[i], clock);
    json.end_array();
    json.member("outside_mm", events.outside_mm);
    end_results(json, warnings, kRainCaution);
    return std::move(json).take();
}

}  // namespace rainledger
