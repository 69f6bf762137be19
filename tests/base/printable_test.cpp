#include "rainledger/base/printable.hpp"

#include "test.hpp"

namespace rainledger {

TEST_CASE("control characters are shown, not obeyed") {
    CHECK(printable("Tannery Lane") == "Tannery Lane");
    CHECK(printable("a\x1b[31mred\n\x7f") == "a?[31mred??");
    CHECK(printable("bo\xc3\xadte \xc2\x9b"
                    "2J") == "bo\xc3\xadte ?2J");
    CHECK(printable("a\xe2\x80\xae"
                    "b\xe2\x81\xa6"
                    "c\xe2\x80\xa8"
                    "d") == "a?b?c?d");
    CHECK(printable("\xe2\x80\x93") == "\xe2\x80\x93");  // an en dash is no control
    CHECK(printable("\xc2") == "\xef\xbf\xbd");
    CHECK(printable("\xff"
                    "a") ==
          "\xef\xbf\xbd"
          "a");
}

}  // namespace rainledger
