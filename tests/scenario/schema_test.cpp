#include <set>
#include <string>

#include <nlohmann/json.hpp>

#include "rainledger/base/quantity.hpp"
#include "rainledger/scenario/field_test_file.hpp"
#include "scenario/read_text.hpp"
#include "scenario/words.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Keys = std::set<std::string>;

Keys keys_of(Words words) {
    return {words.begin(), words.end()};
}

Keys properties_of(const nlohmann::json& map) {
    CHECK(map.at("additionalProperties") == false);
    Keys keys;
    for (const auto& [key, value] : map.at("properties").items())
        keys.insert(key);
    return keys;
}

nlohmann::json schema() {
    return nlohmann::json::parse(scenario_schema());
}

nlohmann::json schema_of_field_tests() {
    return nlohmann::json::parse(field_test_schema());
}

}  // namespace

TEST_CASE("the schema of field tests knows the keys that their reader knows") {
    const nlohmann::json all = schema_of_field_tests();
    const nlohmann::json& maps = all.at("$defs");
    CHECK(properties_of(all) == keys_of(kFieldTestKeys));
    CHECK(properties_of(maps.at("ring")) == keys_of(kRingKeys));
    CHECK(properties_of(maps.at("steady_rate")) == keys_of(kSteadyRateKeys));
    CHECK(all.at("required") == nlohmann::json::array({"readings"}));
    CHECK(maps.at("ring").at("required") == nlohmann::json::array({"inner_diameter"}));
}

TEST_CASE("the schema knows the keys that the reader knows") {
    const nlohmann::json all = schema();
    const nlohmann::json& maps = all.at("$defs");
    CHECK(properties_of(all) == keys_of(kScenarioKeys));
    CHECK(properties_of(maps.at("storm")) == keys_of(kStormKeys));
    CHECK(properties_of(maps.at("hyetograph")) == keys_of(kHyetographKeys));
    CHECK(properties_of(maps.at("steps")) == keys_of(kStepsKeys));
    CHECK(properties_of(maps.at("design")) == keys_of(kDesignKeys));
    CHECK(properties_of(maps.at("formula")) == keys_of(kFormulaKeys));
    CHECK(properties_of(maps.at("record")) == keys_of(kRecordKeys));
    CHECK(properties_of(maps.at("stretch")) == keys_of(kStretchKeys));
    CHECK(properties_of(maps.at("from_record")) == keys_of(kFromRecordKeys));
    CHECK(properties_of(maps.at("surface")) == keys_of(kSurfaceKeys));
    CHECK(properties_of(maps.at("law")) == keys_of(kLaws));
    CHECK(properties_of(maps.at("horton")) == keys_of(kHortonKeys));
    CHECK(properties_of(maps.at("green_ampt")) == keys_of(kGreenAmptKeys));
    CHECK(properties_of(maps.at("philip")) == keys_of(kPhilipKeys));
    CHECK(properties_of(maps.at("constant_rate")) == keys_of(kConstantRateKeys));
    CHECK(properties_of(maps.at("phi_index")) == keys_of(kPhiIndexKeys));
    CHECK(properties_of(maps.at("curve_number")) == keys_of(kCurveNumberKeys));
}

TEST_CASE("every key of the schema is described and its text ends in a newline") {
    for (const std::string& text : {scenario_schema(), field_test_schema()}) {
        CHECK(text.back() == '\n');
        const nlohmann::json all = nlohmann::json::parse(text);
        for (const auto& [name, map] : all.at("$defs").items())
            for (const auto& [key, value] : map.at("properties").items()) {
                INFO(name << "." << key);
                CHECK((value.contains("description") || value.contains("$ref")));
            }
    }
}

TEST_CASE("the schema asks for the keys that the reader misses") {
    const nlohmann::json all = schema();
    const nlohmann::json& maps = all.at("$defs");
    CHECK_FALSE(all.contains("required"));
    CHECK(maps.at("surface").at("required") == nlohmann::json::array({"area", "losses"}));
    CHECK(maps.at("green_ampt").at("required") ==
          nlohmann::json::array({"effective_conductivity"}));
    CHECK(maps.at("green_ampt").at("dependentRequired").at("barrier_rate") ==
          nlohmann::json::array({"storage_limit"}));
    const auto check = [&](const std::string& name, const std::string& problem) {
        for (const auto& key : maps.at(name).at("required")) {
            INFO(name << "." << key);
            CHECK_THAT(problem,
                       Contains("'" + key.get<std::string>() + "' is missing from " + name));
        }
    };
    for (const char* law :
         {"horton", "green_ampt", "philip", "constant_rate", "phi_index", "curve_number"})
        check(law, problems(with_losses("{" + std::string(law) + ": {}}")));
    for (const char* form : {"design", "record"})
        check(form, problems(with_storm("{" + std::string(form) + ": {}}")));
    check("hyetograph", problems(with_storm("{hyetograph: {unit: mm}}")));
    check("formula", problems(with_storm("{design: {formula: {}}}")));
    check("from_record", problems("storms: {from_record: {}}\n"));
}

}  // namespace rainledger
