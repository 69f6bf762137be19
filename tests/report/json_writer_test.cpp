#include "report/json_writer.hpp"

#include <limits>

#include <nlohmann/json.hpp>

#include "test.hpp"

namespace rainledger {
namespace {

std::string escaped(std::string_view text) {
    std::string out;
    append_json_string(out, text);
    return out;
}

}  // namespace

TEST_CASE("strings are escaped, and bytes that are no UTF-8 are replaced") {
    CHECK(escaped("a \"b\" \\ c") == R"("a \"b\" \\ c")");
    CHECK(escaped("\n\t\x01\x1f") == R"("\n\t\u0001\u001f")");
    CHECK(escaped("Grünfläche 雨 🌧") == "\"Grünfläche 雨 🌧\"");
    CHECK(escaped("a\xFFz") == "\"a\xEF\xBF\xBDz\"");
    CHECK(escaped("\xC3") == "\"\xEF\xBF\xBD\"");                       // cut short
    CHECK(escaped("\xE0\x80\x80") == escaped("\xFF\xFF\xFF"));          // overlong
    CHECK(escaped("\xED\xA0\x80") == escaped("\xFF\xFF\xFF"));          // a surrogate
    CHECK(escaped("\xF4\x90\x80\x80") == escaped("\xFF\xFF\xFF\xFF"));  // past U+10FFFF
}

TEST_CASE("what is written parses back to the same values") {
    JsonWriter json;
    json.begin_object();
    json.member("third", 1.0 / 3.0);
    json.member("tiny", std::numeric_limits<double>::denorm_min());
    json.member("minus_zero", -0.0);
    json.member("unlimited", std::numeric_limits<double>::infinity());
    json.member("none", std::optional<double>());
    json.member("some", std::optional<double>(2.5));
    json.member("flag", true);
    json.member("count", std::size_t{24});
    json.key("empty");
    json.begin_array();
    json.end_array();
    json.key("list");
    json.begin_array();
    json.value("a");
    json.value("b");
    json.end_array();
    json.end_object();
    const std::string text = std::move(json).take();
    const auto parsed = nlohmann::json::parse(text);
    CHECK(parsed["third"].get<double>() == 1.0 / 3.0);
    CHECK(parsed["tiny"].get<double>() == std::numeric_limits<double>::denorm_min());
    CHECK(parsed["unlimited"].is_null());
    CHECK(parsed["none"].is_null());
    CHECK(parsed["some"] == 2.5);
    CHECK(parsed["flag"] == true);
    CHECK(parsed["count"] == 24);
    CHECK(parsed["empty"].empty());
    CHECK(parsed["list"] == nlohmann::json{"a", "b"});
    CHECK_THAT(text, Contains("\"minus_zero\": 0,\n"));
    CHECK(text.ends_with("  ]\n}\n"));
}

}  // namespace rainledger
