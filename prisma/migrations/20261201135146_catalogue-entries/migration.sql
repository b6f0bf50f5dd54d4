-- CreateTable
CREATE TABLE "CatalogueEntry" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "kind" TEXT NOT NULL,
    "entry" TEXT NOT NULL,
    "person" TEXT NOT NULL,
    "time" DATETIME NOT NULL
);
