#include "scenario/schema_storms.hpp"

#include <string>
#include <string_view>
#include <vector>

#include "rainledger/reference/mass_curves.hpp"

namespace rainledger {
namespace {

Json storm_schema() {
    return closed(
        {{"hyetograph",
          described(any_of({text(), reference("hyetograph")}),
                    "A CSV file, relative to this file; or a map saying how to read it.")},
         {"steps", described(reference("steps"), "The rain written out step by step.")},
         {"design", described(reference("design"), "A design storm.")},
         {"record", described(reference("record"), "An event out of a gauge record.")},
         {"resample",
          quantity(Dimension::time, "Length of the steps that its rain is brought to.")},
         {"multiply_by", described(at_least_zero(), "Factor on every depth. Default 1.")},
         {"continue_for",
          quantity(Dimension::time, "Dry time appended so that ponds drain. Default none.")}},
        {}, one_required({kRainForms.begin(), kRainForms.end()}));
}

Json hyetograph_schema() {
    return closed(
        {{"file", described(text(), "CSV file, relative to this file.")},
         {"time", described(text(), "Header of the time column, in full.")},
         {"rain", described(text(), "Header of the rain column, in full.")},
         {"unit", described(text(), "Unit of the rain column: mm, in, mm/h, in/h and the like.")},
         {"time_unit", described(text(), "Unit of elapsed times: s, min, h, d.")},
         {"kind", described(words(kRainKinds), "What the rain column holds.")},
         {"stamp", described(words(kStamps), "Which edge of its step a row's time marks.")},
         {"every", quantity(Dimension::time, "How long each row covers.")},
         {"zone", described(text(), "Time zone by place, such as Europe/Madrid.")},
         {"gaps", described(words(kGaps), "dry: holes and empty cells are zero rain.")},
         {"missing", described(text(), "Text that marks a missing value.")}},
        {"file"});
}

Json steps_schema() {
    Json ends = {{"type", "array"}, {"minItems", 1}};
    ends["items"] = quantity(Dimension::time, "End of a step, from the storm's start.");
    Json numbers = {{"type", "array"}, {"minItems", 1}};
    numbers["items"] = at_least_zero();
    Json all =
        Json::array({one_required({"every", "ends"}), one_required({"depths", "intensities"})});
    return closed(
        {{"every", quantity(Dimension::time, "Length of every step.")},
         {"ends", described(ends, "Ends of the steps, rising.")},
         {"depths", described(numbers, "Rain of each step, in 'unit'.")},
         {"intensities", described(numbers, "Intensity in each step, in 'unit'.")},
         {"unit", described(text(), "mm or in for depths, mm/h or in/h for intensities.")}},
        {"unit"}, {{"allOf", all}});
}

/// What holds where the design's pattern is one of these.
Json where_pattern(const std::vector<std::string>& patterns, const Json& holds) {
    Json pattern = {{"required", {"pattern"}}};
    pattern["properties"]["pattern"]["enum"] = patterns;
    return Json::object({{"if", pattern}, {"then", holds}});
}

/// A map in which these keys do not stand.
Json without(const std::vector<std::string>& keys) {
    Json schema = Json::object();
    for (const std::string& key : keys)
        schema["properties"][key] = false;
    return schema;
}

Json curve_schema() {
    std::vector<std::string_view> names;
    for (const MassCurveEntry& entry : mass_curve_table())
        names.push_back(entry.name);
    const Json point = {{"type", "array"}, {"minItems", 2}, {"maxItems", 2}, {"items", fraction()}};
    const Json points = {{"type", "array"}, {"minItems", 2}, {"items", point}};
    return any_of({words(names), points});
}

Json depths_schema() {
    Json depths = {{"type", "object"}, {"minProperties", 1}};
    depths["propertyNames"]["pattern"] = quantity(Dimension::time, "").at("pattern");
    depths["additionalProperties"] = quantity(Dimension::depth, "Depth of that duration.");
    return depths;
}

Json design_schema() {
    Json rules = Json::array({one_required({kDepthSources.begin(), kDepthSources.end()})});
    rules.push_back(where_pattern({"mass_curve"}, {{"required", {"curve"}}}));
    rules.back()["else"] = without({"curve", "interpolate"});
    rules.push_back(where_pattern({"uniform", "mass_curve"}, without({"peak_at"})));
    rules.push_back(where_pattern({"alternating_blocks"}, without({"depth"})));
    rules.push_back(where_pattern({"keifer_chu"}, {{"required", {"formula"}}}));
    Json table = Json::object();
    table["return_period"] = {"statistics"};
    return closed(
        {{"pattern", described(words(kPatterns), "Shape of the storm in time.")},
         {"duration", quantity(Dimension::time, "Duration of the storm.")},
         {"every", quantity(Dimension::time, "Length of its steps.")},
         {"peak_at", described(fraction(), "Share of the duration at the peak. Default 0.5.")},
         {"curve", described(curve_schema(), "A mass curve by name, or its points as shares.")},
         {"interpolate",
          described(words(kInterpolate), "Between the curve's points. Default linear.")},
         {"return_period", quantity(Dimension::frequency, "Column of the statistics.")},
         {"statistics", described(text(), "CSV table of depths by duration and return period.")},
         {"depth", quantity(Dimension::depth, "Total depth.")},
         {"depths", described(depths_schema(), "Depths by duration, rising.")},
         {"formula", described(reference("formula"), "Intensity a / (t^m + b)^n.")}},
        {"pattern", "duration", "every"}, {{"allOf", rules}, {"dependentRequired", table}});
}

Json formula_schema() {
    return closed({{"a", quantity(Dimension::rate, "Above zero.")},
                   {"b", described(any_of({Json{{"type", "number"}}, text()}), "A plain number.")},
                   {"m", described(number({{"exclusiveMinimum", 0}}), "Default 1.")},
                   {"n", described(number({{"exclusiveMinimum", 0}}), "Default 1.")},
                   {"time", described(words(kFormulaTimes), "Unit of t.")}},
                  {"a", "b", "time"});
}

Json event_schema() {
    const Json number = {{"type", "integer"}, {"minimum", 1}};
    return any_of({Json{{"const", kLargest}}, number, reference("stretch")});
}

Json stretch_schema() {
    const Json stamp = {{"type", "string"},
                        {"pattern", "^[0-9]{4}-[0-9]{2}-[0-9]{2}[T ][0-9]{2}:[0-9]{2}"}};
    return closed({{"from", described(stamp, "Start on the gauge's clock.")},
                   {"to", described(stamp, "End on the gauge's clock.")}},
                  {"from", "to"});
}

/// The keys that `record` and `from_record` share, and one of their own.
Json record_schema(const std::string& own, const Json& value, bool own_required) {
    std::vector<std::pair<std::string, Json>> keys = {
        {"file", described(text(), "CSV file of the record, relative to this file.")},
        {"tip", quantity(Dimension::depth, "Depth of one tip: the record is a tip log.")},
        {"count", described(words(kCounts), "How a column of counts is meant. Default per_row.")},
        {"tips", described(words(kTips), "How tips become steps. Default in_steps.")},
        {"every", quantity(Dimension::time, "Steps that tips become, or what each row covers.")},
        {"dry_spell", quantity(Dimension::time, "Time that parts events. Default 6 h.")},
        {"threshold", quantity(Dimension::depth, "Less than this in it is dry. Default 0.")},
        {own, value},
        {"statistics", described(text(), "CSV table that tells how rare an event was.")}};
    const Json hyetograph = hyetograph_schema();
    for (const std::string_view key :
         {"time", "rain", "unit", "time_unit", "kind", "stamp", "zone", "missing"})
        keys.emplace_back(key, hyetograph.at("properties").at(key));
    std::vector<std::string> required = {"file"};
    if (own_required) required.push_back(own);
    Json tips = Json::object();
    tips["count"] = {"tip"};
    tips["tips"] = {"tip"};
    Json rows = Json::object();
    rows["tip"] = without({"unit", "time_unit", "kind", "stamp"});
    return closed(keys, required, {{"dependentRequired", tips}, {"dependentSchemas", rows}});
}

}  // namespace

Json storm_definitions() {
    return {
        {"storm", storm_schema()},
        {"hyetograph", hyetograph_schema()},
        {"steps", steps_schema()},
        {"design", design_schema()},
        {"formula", formula_schema()},
        {"record",
         record_schema(
             "event", described(event_schema(), "largest, a number by time, or a stretch."), true)},
        {"stretch", stretch_schema()},
        {"from_record",
         record_schema("at_least", quantity(Dimension::depth, "Depth of the least event."),
                       false)}};
}

}  // namespace rainledger
