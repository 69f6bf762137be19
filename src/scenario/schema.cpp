#include <string>

#include <nlohmann/json.hpp>

#include "rainledger/scenario/scenario.hpp"
#include "scenario/schema_storms.hpp"
#include "scenario/schema_values.hpp"
#include "scenario/words.hpp"

// The JSON Schema of the scenario YAML, for editors. It knows the keys, the shapes and the units;
// what takes more than one key to judge is the reader's.
namespace rainledger {
namespace {

Json surface_schema() {
    Json shares = {{"type", "object"}, {"minProperties", 1}};
    shares["additionalProperties"] = share();
    return closed(
        {{"area", quantity(Dimension::area, "Area, above zero.")},
         {"drains_to",
          described(shown_text(","), "Inlet or outfall that its excess goes to. Default outlet.")},
         {"interception", quantity(Dimension::depth, "Rain held by plants, once. Default 0.")},
         {"depression_storage", quantity(Dimension::depth, "Depth held in hollows. Default 0.")},
         {"ponded_water",
          described(words(kPondedWater), "What becomes of water in hollows. Default infiltrates.")},
         {"losses", described(any_of({Json{{"const", kImpervious}}, reference("law")}),
                              "The word impervious, or one law with its parameters.")},
         {"runs_onto", described(any_of({text(), shares}),
                                 "Surface that its excess runs onto, or shares by surface.")}},
        {"area", "losses"});
}

Json law_schema() {
    Json laws = closed({{"horton", reference("horton")},
                        {"green_ampt", reference("green_ampt")},
                        {"philip", reference("philip")},
                        {"constant_rate", reference("constant_rate")},
                        {"phi_index", reference("phi_index")},
                        {"curve_number", reference("curve_number")}},
                       {});
    laws["minProperties"] = 1;
    laws["maxProperties"] = 1;
    return laws;
}

Json horton_schema() {
    return closed(
        {{"initial_capacity", quantity(Dimension::rate, "f0.")},
         {"final_capacity", quantity(Dimension::rate, "fc, at most f0.")},
         {"decay", quantity(Dimension::decay, "k.")},
         {"follows", described(words(kFollows), "Default infiltrated_depth.")},
         {"recovery", quantity(Dimension::decay, "Return of capacity in dry time. Default 0.")}},
        {"initial_capacity", "final_capacity", "decay"});
}

Json green_ampt_schema() {
    const Json pair = {{"required", {"wetting_front_suction", "moisture_deficit"}}};
    const Json product = {{"required", {"suction_deficit"}}};
    const Json barrier = {{"barrier_rate", {"storage_limit"}}};
    return closed(
        {{"effective_conductivity", quantity(Dimension::rate, "K.")},
         {"wetting_front_suction", quantity(Dimension::suction, "psi.")},
         {"moisture_deficit", described(fraction(), "Porosity less initial water content.")},
         {"suction_deficit",
          quantity(Dimension::suction, "psi times the deficit, in place of both.")},
         {"storage_limit", quantity(Dimension::depth, "Pore space above a barrier. Default none.")},
         {"barrier_rate", quantity(Dimension::rate, "Capacity once that is full. Default 0.")}},
        {"effective_conductivity"},
        {{"oneOf", Json::array({pair, product})}, {"dependentRequired", barrier}});
}

Json philip_schema() {
    return closed({{"sorptivity", quantity(Dimension::sorptivity, "Sorptivity.")},
                   {"steady_term", quantity(Dimension::rate, "A.")}},
                  {"sorptivity", "steady_term"});
}

Json constant_rate_schema() {
    return closed({{"rate", quantity(Dimension::rate, "Constant capacity.")},
                   {"initial_loss",
                    quantity(Dimension::depth, "Depth lost before the rate acts. Default 0.")}},
                  {"rate"});
}

Json phi_index_schema() {
    return closed(
        {{"observed_excess",
          quantity(Dimension::depth, "Total excess that the constant rate is to leave.")}},
        {"observed_excess"});
}

Json curve_number_schema() {
    return closed(
        {{"number", described(number({{"exclusiveMinimum", 0}, {"maximum", 100}}),
                              "Curve number for antecedent condition II.")},
         {"initial_abstraction_ratio", described(fraction(), "Ia over S. Default 0.2.")},
         {"tabulated_ratio", described(fraction(),
                                       "The ratio that the number was tabulated for: 0.2 beside a "
                                       "ratio of 0.05 converts it.")},
         {"antecedent", described(words(kConditions), "Antecedent runoff condition. Default II.")}},
        {"number"});
}

Json definitions() {
    Json all = storm_definitions();
    all.update(Json{{"surface", surface_schema()},
                    {"law", law_schema()},
                    {"horton", horton_schema()},
                    {"green_ampt", green_ampt_schema()},
                    {"philip", philip_schema()},
                    {"constant_rate", constant_rate_schema()},
                    {"phi_index", phi_index_schema()},
                    {"curve_number", curve_number_schema()}});
    return all;
}

/// A map of things by name.
Json named(const std::string& what, const Json& names) {
    Json map = {{"type", "object"}, {"minProperties", 1}, {"propertyNames", names}};
    map["additionalProperties"] = reference(what);
    return map;
}

/// Storms by name, or those of a record alone.
Json storms_schema(const Json& names) {
    Json map = named("storm", names);
    map["properties"] = Json::object(
        {{kFromRecord, described(reference("from_record"), "The events of a gauge record.")}});
    map["dependentSchemas"] = Json::object({{kFromRecord, Json::object({{"maxProperties", 1}})}});
    return map;
}

}  // namespace

std::string scenario_schema() {
    const Json plain_name = name(".,");
    Json surface_name = plain_name;
    surface_name["not"] = words(kReservedNames);
    Json schema = {{"$schema", "https://json-schema.org/draft/2020-12/schema"},
                   {"title", "rainledger scenario"},
                   {"description", "A site and the storms that fall on it."}};
    schema.update(closed(
        {{"title", described(shown_text(), "Title of the results. Default the file's name.")},
         {"storm", described(reference("storm"), "The one storm.")},
         {"storms", described(storms_schema(plain_name), "Several storms by name.")},
         {"surfaces", described(named("surface", surface_name),
                                "The surfaces by name. Losses need them; storms alone do not.")}},
        {}, one_required({"storm", "storms"})));
    schema["$defs"] = definitions();
    return schema.dump(2) + "\n";
}

}  // namespace rainledger
