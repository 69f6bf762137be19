#include "report/text_table.hpp"

#include "test.hpp"

namespace rainledger {

TEST_CASE("columns are as wide as their widest cell, counted in code points") {
    TextTable table;
    table.column("surface", Align::left);
    table.column("area|m2", Align::right);
    table.row({"Grünfläche", "1600"});
    table.row({"yard", "80"});
    CHECK(table.text() ==
          "              area\n"
          "  surface       m2\n"
          "  ----------------\n"
          "  Grünfläche  1600\n"
          "  yard          80\n");
}

TEST_CASE("decimal points stand below one another, words at the right") {
    TextTable table;
    table.column("flow", Align::point);
    table.column("", Align::left);
    table.row({"342"});
    table.row({"34.2", "x"});
    table.rule();
    table.row({"0.342"});
    table.row({"-1.5"});
    table.row({"-"});
    table.row({""});
    CHECK(table.text() ==
          "     flow\n"
          "  ----------\n"
          "  342\n"
          "   34.2    x\n"
          "  ----------\n"
          "    0.342\n"
          "   -1.5\n"
          "        -\n"
          "\n");
}

TEST_CASE("wrapping breaks after a comma or semicolon and indents what follows") {
    CHECK(wrapped("  a: ", "1 mm, 2 mm; 3 mm", 13, 4) == "  a: 1 mm,\n    2 mm;\n    3 mm\n");
    CHECK(wrapped("  a: ", "1 mm, 2 mm; 3 mm", 16, 4) == "  a: 1 mm, 2 mm;\n    3 mm\n");
    CHECK(wrapped("", "longer than the line, x", 5, 2) == "longer than the line,\n  x\n");
    CHECK(wrapped("", "été, été", 8, 0) == "été, été\n");
    CHECK(wrapped("lead", "", 7, 0) == "lead\n");
    CHECK(wrapped("", "1,5 mm", 3, 0) == "1,5 mm\n");
}

}  // namespace rainledger
